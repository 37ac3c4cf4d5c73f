import { useId, useState, type Ref } from 'react';
import { TextInput, View, type TextInputProps } from 'react-native';
import { Button } from '@/components/ui/button';
import { fieldBox } from '@/components/ui/field-box';
import { FieldShell, fieldAria, type FieldShellProps } from '@/components/ui/field-shell';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { Txt } from '@/components/ui/text';
import { textSizes } from '@/components/ui/theme/metrics';
import { sansFace } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

type InputProps = Pick<
  TextInputProps,
  | 'autoComplete'
  | 'autoCapitalize'
  | 'autoFocus'
  | 'enterKeyHint'
  | 'inputMode'
  | 'keyboardType'
  | 'maxLength'
  | 'onFocus'
  | 'onSubmitEditing'
  | 'placeholder'
  | 'secureTextEntry'
>;

export interface TextFieldProps extends InputProps, FieldShellProps {
  readonly value: string;
  readonly onChangeText: (text: string) => void;
  readonly onBlur?: () => void;
  /** The unit, at the right inside the box. */
  readonly suffix?: string;
  readonly icon?: IconName;
  readonly multiline?: boolean;
  /** Height of a multiline field, in lines; 3 unless told. */
  readonly lines?: number;
  readonly disabled?: boolean;
  readonly required?: boolean;
  readonly align?: 'left' | 'right';
  readonly ref?: Ref<TextInput>;
}

/** A line or a box to write in, with its label, unit, hint and error. */
export function TextField(props: TextFieldProps) {
  const { label, hideLabel, hint, error, value, onChangeText, onBlur, suffix, icon } = props;
  const {
    multiline = false,
    lines = 3,
    disabled = false,
    required = false,
    align,
    secureTextEntry = false,
    ref,
  } = props;
  const colours = useColours();
  const id = useId();
  const suffixId = `${id}-unit`;
  const [isCovered, setIsCovered] = useState(true);
  const shell = { label, hideLabel, hint, error };
  const box = fieldBox(colours, error !== undefined && error !== '');
  const aria = fieldAria(id, shell);
  const describedBy = [aria['aria-describedby'], suffix === undefined ? undefined : suffixId].filter(Boolean).join(' ');
  const { lineHeight } = textSizes.body;
  return (
    <FieldShell {...shell} controlId={id}>
      <View style={{ justifyContent: 'center' }}>
        {icon === undefined ? null : (
          <View style={{ position: 'absolute', left: 13, zIndex: 1, pointerEvents: 'none' }}>
            <Icon name={icon} size={20} colour="inkSoft" />
          </View>
        )}
        <TextInput
          {...inputProps(props)}
          {...aria}
          {...(describedBy === '' ? {} : { 'aria-describedby': describedBy })}
          {...(required ? { 'aria-required': true } : {})}
          id={id}
          ref={ref}
          value={value}
          onChangeText={onChangeText}
          onBlur={onBlur}
          editable={!disabled}
          multiline={multiline}
          secureTextEntry={secureTextEntry && isCovered}
          placeholderTextColor={colours.inkSoft}
          style={[
            box,
            textSizes.body,
            sansFace('regular'),
            multiline ? { height: lineHeight * lines + 22, paddingVertical: 10 } : null,
            icon === undefined ? null : { paddingLeft: 42 },
            suffix === undefined ? null : { paddingRight: 24 + suffix.length * 7.5 },
            secureTextEntry ? { paddingRight: 52 } : null,
            align === undefined ? null : { textAlign: align },
            disabled ? { backgroundColor: colours.well, color: colours.inkSoft } : null,
          ]}
        />
        {suffix === undefined ? null : (
          <View style={{ position: 'absolute', right: 13, pointerEvents: 'none' }}>
            <Txt id={suffixId} size="row" colour="inkSoft">
              {suffix}
            </Txt>
          </View>
        )}
        {secureTextEntry ? (
          <View style={{ position: 'absolute', right: 2 }}>
            <Button
              kind="text"
              iconOnly
              icon={isCovered ? 'covered' : 'uncovered'}
              label={isCovered ? `Show ${label.toLowerCase()}` : `Hide ${label.toLowerCase()}`}
              onPress={() => setIsCovered(!isCovered)}
            />
          </View>
        ) : null}
      </View>
    </FieldShell>
  );
}

/** The props that go to the input as they are. */
function inputProps({
  autoComplete,
  autoCapitalize,
  autoFocus,
  enterKeyHint,
  inputMode,
  keyboardType,
  maxLength,
  onFocus,
  onSubmitEditing,
  placeholder,
}: TextFieldProps): InputProps {
  return {
    autoComplete,
    autoCapitalize,
    autoFocus,
    enterKeyHint,
    inputMode,
    keyboardType,
    maxLength,
    onFocus,
    onSubmitEditing,
    placeholder,
  };
}
