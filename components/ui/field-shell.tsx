import { type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

/** What every field takes around its control. */
export interface FieldShellProps {
  readonly label: string;
  /** The label stays for screen readers only. */
  readonly hideLabel?: boolean;
  readonly hint?: string;
  readonly error?: string;
}

interface Props extends FieldShellProps {
  readonly controlId: string;
  readonly children: ReactNode;
}

const hintIdOf = (controlId: string) => `${controlId}-hint`;
const errorIdOf = (controlId: string) => `${controlId}-error`;

interface FieldAria {
  readonly 'aria-label'?: string;
  readonly 'aria-invalid'?: true;
  readonly 'aria-describedby'?: string;
}

/** The aria props of a control: which words describe it, and whether it is refused. */
export function fieldAria(controlId: string, { hint, error, label, hideLabel }: FieldShellProps): FieldAria {
  const hasError = error !== undefined && error !== '';
  return {
    ...(hideLabel ? { 'aria-label': label } : {}),
    ...(hasError
      ? { 'aria-invalid': true, 'aria-describedby': errorIdOf(controlId) }
      : hint === undefined
        ? {}
        : { 'aria-describedby': hintIdOf(controlId) }),
  };
}

/** Label above, control, and below it the error or else the hint. */
export function FieldShell({ label, hideLabel = false, hint, error, controlId, children }: Props) {
  const colours = useColours();
  const hasError = error !== undefined && error !== '';
  return (
    <View style={{ gap: 4, minWidth: 0 }}>
      {hideLabel ? null : (
        <label htmlFor={controlId} style={{ ...pageText('row', 'medium'), color: colours.ink }}>
          {label}
        </label>
      )}
      {children}
      {/* Always there, so that an error that comes later is read out. */}
      <View role="alert" style={hasError ? { flexDirection: 'row', gap: 6, paddingTop: 1 } : { marginTop: -4 }}>
        {hasError ? (
          <>
            <View style={{ paddingTop: 1 }}>
              <Icon name="warning" size={14} colour="rust" />
            </View>
            <Txt id={errorIdOf(controlId)} size="note" weight="medium" colour="rust" style={{ flexShrink: 1 }}>
              {error}
            </Txt>
          </>
        ) : null}
      </View>
      {!hasError && hint !== undefined ? (
        <Txt id={hintIdOf(controlId)} size="note" colour="inkSoft">
          {hint}
        </Txt>
      ) : null}
    </View>
  );
}
