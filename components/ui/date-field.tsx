import { useId } from 'react';
import { fieldBox } from '@/components/ui/field-box';
import { FieldShell, fieldAria, type FieldShellProps } from '@/components/ui/field-shell';
import { formatDate } from '@/components/ui/number-format';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props extends FieldShellProps {
  /** 'YYYY-MM-DD', or empty. */
  readonly value: string;
  /** Told 'YYYY-MM-DD', or empty while no whole date is there. */
  readonly onChange: (value: string) => void;
  readonly onBlur?: () => void;
  readonly min?: string;
  readonly max?: string;
  readonly disabled?: boolean;
}

/** A date: the browser's own field and calendar; where there is none, the date is typed as 2026-12-09. */
export function DateField({
  label,
  hideLabel,
  hint,
  error,
  value,
  onChange,
  onBlur,
  min,
  max,
  disabled = false,
}: Props) {
  const colours = useColours();
  const id = useId();
  // The browser shows the date in the order of its own language; the words leave no doubt.
  const shell = {
    label,
    hideLabel,
    error,
    hint: hint ?? (value === '' || hideLabel ? undefined : formatDate(value, 'full')),
  };
  return (
    <FieldShell {...shell} controlId={id}>
      <input
        {...fieldAria(id, shell)}
        id={id}
        type="date"
        pattern="\d{4}-\d{2}-\d{2}"
        placeholder="2026-12-09"
        value={value}
        min={min}
        max={max}
        disabled={disabled}
        onBlur={onBlur}
        onChange={(event) => onChange(event.currentTarget.value)}
        style={{
          ...fieldBox(colours, error !== undefined && error !== ''),
          ...pageText('body'),
          width: '100%',
          margin: 0,
          boxSizing: 'border-box',
          ...(disabled ? { backgroundColor: colours.well, color: colours.inkSoft } : {}),
        }}
      />
    </FieldShell>
  );
}
