import { Link } from 'expo-router';
import { View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { textSizes } from '@/components/ui/theme/metrics';
import { sansFace } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

/** Stands under every output. */
export function CautionLine() {
  const colours = useColours();
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
      <Icon name="info" size={14} colour="inkSoft" />
      <Txt size="note" colour="inkSoft">
        {'Estimates, not advice. '}
        <Link
          href="/caution"
          style={[textSizes.note, sansFace('regular'), { color: colours.inkSoft, textDecorationLine: 'underline' }]}
        >
          Full caution
        </Link>
      </Txt>
    </View>
  );
}
