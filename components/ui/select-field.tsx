import { useId } from 'react';
import { View } from 'react-native';
import { fieldBox } from '@/components/ui/field-box';
import { FieldShell, fieldAria, type FieldShellProps } from '@/components/ui/field-shell';
import { Icon } from '@/components/ui/icon';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

export interface SelectOption<V extends string> {
  readonly value: V;
  readonly label: string;
  /** Stands after the label in the list. */
  readonly detail?: string;
}

interface Props<V extends string> extends FieldShellProps {
  readonly value: V;
  readonly options: readonly SelectOption<V>[];
  readonly onChange: (value: V) => void;
  readonly onBlur?: () => void;
  readonly disabled?: boolean;
  /** Shown, and cannot be chosen, while the value is none of the options. */
  readonly placeholder?: string;
}

/** One choice from a list; the browser's own list, so that it works by keyboard, touch and screen reader alike. */
export function SelectField<V extends string>(props: Props<V>) {
  const {
    label,
    hideLabel,
    hint,
    error,
    value,
    options,
    onChange,
    onBlur,
    disabled = false,
    placeholder = 'Choose',
  } = props;
  const colours = useColours();
  const id = useId();
  const shell = { label, hideLabel, hint, error };
  const isKnown = options.some((option) => option.value === value);
  return (
    <FieldShell {...shell} controlId={id}>
      <View style={{ justifyContent: 'center' }}>
        <select
          {...fieldAria(id, shell)}
          id={id}
          value={isKnown ? value : ''}
          disabled={disabled}
          onBlur={onBlur}
          onChange={(event) => {
            const chosen = options.find((option) => option.value === event.currentTarget.value);
            if (chosen !== undefined) onChange(chosen.value);
          }}
          style={{
            ...fieldBox(colours, error !== undefined && error !== ''),
            ...pageText('body'),
            width: '100%',
            margin: 0,
            paddingRight: 40,
            appearance: 'none',
            textOverflow: 'ellipsis',
            cursor: disabled ? 'default' : 'pointer',
            ...(disabled ? { backgroundColor: colours.well, color: colours.inkSoft, opacity: 1 } : {}),
          }}
        >
          {isKnown ? null : (
            <option value="" disabled>
              {placeholder}
            </option>
          )}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.detail === undefined ? option.label : `${option.label}, ${option.detail}`}
            </option>
          ))}
        </select>
        <View style={{ position: 'absolute', right: 13, pointerEvents: 'none' }}>
          <Icon name="chevron-down" size={18} colour="inkSoft" />
        </View>
      </View>
    </FieldShell>
  );
}
