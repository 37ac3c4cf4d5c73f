import { View } from 'react-native';
import { type Href } from 'expo-router';
import { Button } from '@/components/ui/button';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { Txt } from '@/components/ui/text';
import { radius } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

const looks = {
  amber: { ground: 'amberWash', icon: 'warning', role: 'status' },
  rust: { ground: 'rustWash', icon: 'warning', role: 'alert' },
  leaf: { ground: 'leafWash', icon: 'check', role: 'status' },
} as const;

interface Props {
  /** Amber: caution. Rust: refused; read out at once. Leaf: done. */
  readonly kind: keyof typeof looks;
  readonly title: string;
  readonly text?: string;
  readonly icon?: IconName;
  readonly action?: { readonly label: string; readonly onPress?: () => unknown; readonly href?: Href };
}

/** A message that belongs to what stands below it. */
export function Banner({ kind, title, text, icon, action }: Props) {
  const colours = useColours();
  const look = looks[kind];
  return (
    <View
      role={look.role}
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'center',
        justifyContent: 'flex-end',
        columnGap: 16,
        rowGap: 8,
        paddingVertical: 12,
        paddingHorizontal: 14,
        borderRadius: radius.control,
        backgroundColor: colours[look.ground],
      }}
    >
      <View style={{ flexDirection: 'row', gap: 10, flexGrow: 1, flexShrink: 1, flexBasis: 200 }}>
        <View style={{ paddingTop: 1 }}>
          <Icon name={icon ?? look.icon} size={18} colour={kind} />
        </View>
        <Txt size="row" style={{ flexShrink: 1 }}>
          <Txt size="row" weight="semibold" colour={kind}>
            {title}
          </Txt>
          {text === undefined ? '' : ` ${text}`}
        </Txt>
      </View>
      {action === undefined ? null : <Button kind="text" tone={kind} {...action} />}
    </View>
  );
}
