import { useId } from 'react';
import { View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props<V extends string> {
  readonly label: string;
  readonly hideLabel?: boolean;
  readonly options: readonly { readonly value: V; readonly label: string; readonly detail?: string }[];
  readonly value: V;
  readonly onChange: (value: V) => void;
  readonly disabled?: boolean;
}

/** One choice of several, under one another, each with room for a line of detail. */
export function RadioGroup<V extends string>({
  label,
  hideLabel = false,
  options,
  value,
  onChange,
  disabled = false,
}: Props<V>) {
  const colours = useColours();
  const name = useId();
  return (
    <fieldset style={{ border: 0, margin: 0, padding: 0, minWidth: 0 }} aria-label={hideLabel ? label : undefined}>
      {hideLabel ? null : (
        <legend style={{ ...pageText('row', 'medium'), color: colours.ink, padding: 0 }}>{label}</legend>
      )}
      {options.map((option) => {
        const isChosen = option.value === value;
        const ink = disabled ? colours.inkSoft : colours.bramble;
        return (
          <label
            key={option.value}
            style={{ display: 'flex', alignItems: 'center', gap: 12, minHeight: sizes.target, cursor: 'pointer' }}
          >
            <input
              type="radio"
              name={name}
              checked={isChosen}
              disabled={disabled}
              onChange={() => onChange(option.value)}
              style={{
                appearance: 'none',
                margin: 0,
                flexShrink: 0,
                width: 24,
                height: 24,
                borderRadius: 12,
                border: `${isChosen ? 2 : 1.5}px solid ${isChosen ? ink : colours.edge}`,
                background: isChosen ? `radial-gradient(circle, ${ink} 5.5px, ${colours.sheet} 6px)` : colours.sheet,
              }}
            />
            <View style={{ flexShrink: 1 }}>
              <Txt colour={disabled ? 'inkSoft' : 'ink'}>{option.label}</Txt>
              {option.detail === undefined ? null : (
                <Txt size="note" colour="inkSoft">
                  {option.detail}
                </Txt>
              )}
            </View>
          </label>
        );
      })}
    </fieldset>
  );
}
