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

/** A setting that is on or off from the moment it is touched. */
export function SwitchField({ label, detail, value, onChange, disabled = false }: Props) {
  const colours = useColours();
  const isOn = value && !disabled;
  return (
    <label
      style={{
        display: 'flex',
        alignItems: 'center',
        justifyContent: 'space-between',
        gap: 16,
        minHeight: sizes.target,
        cursor: disabled ? 'default' : 'pointer',
      }}
    >
      <View style={{ flexShrink: 1 }}>
        <Txt colour={disabled ? 'inkSoft' : 'ink'}>{label}</Txt>
        {detail === undefined ? null : (
          <Txt size="note" colour="inkSoft">
            {detail}
          </Txt>
        )}
      </View>
      <View style={{ width: 48, height: 28 }}>
        <input
          type="checkbox"
          role="switch"
          checked={value}
          disabled={disabled}
          onChange={(event) => onChange(event.currentTarget.checked)}
          style={{
            appearance: 'none',
            margin: 0,
            width: 48,
            height: 28,
            borderRadius: 14,
            border: `1.5px solid ${isOn ? colours.bramble : colours.edge}`,
            backgroundColor: isOn ? colours.bramble : colours.well,
            cursor: 'inherit',
          }}
        />
        <View
          style={{
            position: 'absolute',
            top: 4,
            left: value ? 24 : 4,
            width: 20,
            height: 20,
            borderRadius: 10,
            alignItems: 'center',
            justifyContent: 'center',
            backgroundColor: isOn ? colours.onBramble : colours.edge,
            pointerEvents: 'none',
          }}
        >
          {isOn ? <Icon name="check" size={14} colour="bramble" /> : null}
        </View>
      </View>
    </label>
  );
}
