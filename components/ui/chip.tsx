import { View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { Txt } from '@/components/ui/text';
import { type ColourName } from '@/components/ui/theme/colours';
import { radius, sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

type ChipKind = 'plain' | 'amber' | 'bramble' | 'leaf' | 'rust';

const looks: Record<ChipKind, { ground: ColourName; ink: ColourName }> = {
  plain: { ground: 'sheet', ink: 'ink' },
  amber: { ground: 'amberWash', ink: 'amber' },
  bramble: { ground: 'brambleWash', ink: 'bramble' },
  leaf: { ground: 'leafWash', ink: 'leaf' },
  rust: { ground: 'rustWash', ink: 'rust' },
};

interface Props {
  readonly kind?: ChipKind;
  readonly icon?: IconName;
  readonly label: string;
}

/** A short word about a thing; it cannot be pressed. */
export function Chip({ kind = 'plain', icon, label }: Props) {
  const colours = useColours();
  const look = looks[kind];
  return (
    <View
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        alignSelf: 'flex-start',
        gap: 5,
        minHeight: sizes.chip,
        paddingHorizontal: 10,
        borderRadius: radius.chip,
        borderWidth: 1,
        borderColor: kind === 'plain' ? colours.rule : 'transparent',
        backgroundColor: colours[look.ground],
      }}
    >
      {icon === undefined ? null : <Icon name={icon} size={14} colour={look.ink} />}
      <Txt size="note" weight="medium" colour={look.ink}>
        {label}
      </Txt>
    </View>
  );
}
