import { type CSSProperties } from 'react';
import { View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly label: string;
  readonly detail?: string;
  readonly value: boolean;
  readonly onChange: (value: boolean) => void;
  readonly disabled?: boolean;
}

const row: CSSProperties = { display: 'flex', alignItems: 'center', gap: 12, minHeight: sizes.target };

/** One thing that holds or does not. */
export function Checkbox({ label, detail, value, onChange, disabled = false }: Props) {
  const colours = useColours();
  return (
    <label style={{ ...row, cursor: disabled ? 'default' : 'pointer' }}>
      <View style={{ width: 24, height: 24 }}>
        <input
          type="checkbox"
          checked={value}
          disabled={disabled}
          onChange={(event) => onChange(event.currentTarget.checked)}
          style={{
            appearance: 'none',
            margin: 0,
            width: 24,
            height: 24,
            borderRadius: 5,
            border: `1.5px solid ${value && !disabled ? colours.bramble : colours.edge}`,
            backgroundColor: disabled ? colours.well : value ? colours.bramble : colours.sheet,
            cursor: 'inherit',
          }}
        />
        {value ? (
          <View style={{ position: 'absolute', top: 3, left: 3, pointerEvents: 'none' }}>
            <Icon name="check" size={18} colour={disabled ? 'inkSoft' : 'onBramble'} />
          </View>
        ) : null}
      </View>
      <View style={{ flexShrink: 1 }}>
        <Txt colour={disabled ? 'inkSoft' : 'ink'}>{label}</Txt>
        {detail === undefined ? null : (
          <Txt size="note" colour="inkSoft">
            {detail}
          </Txt>
        )}
      </View>
    </label>
  );
}
