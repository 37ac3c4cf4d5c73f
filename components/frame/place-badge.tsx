import { View } from 'react-native';
import { HiddenText } from '@/components/ui/hidden-text';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

/** How many things wait, at the shoulder of a place's icon. */
export function PlaceBadge({ count }: { count: number | undefined }) {
  const colours = useColours();
  if (count === undefined || count <= 0) return null;
  return (
    <View
      style={{
        position: 'absolute',
        left: 16,
        top: -8,
        minWidth: 20,
        height: 20,
        paddingHorizontal: 5,
        borderRadius: 10,
        alignItems: 'center',
        justifyContent: 'center',
        backgroundColor: colours.bramble,
      }}
    >
      <Txt size="note" weight="semibold" colour="onBramble">
        <span aria-hidden>{count > 99 ? '99+' : count}</span>
        <HiddenText>{`, ${count} waiting`}</HiddenText>
      </Txt>
    </View>
  );
}
