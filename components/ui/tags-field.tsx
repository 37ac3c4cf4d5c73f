import { useId, useState } from 'react';
import { Pressable, TextInput, View } from 'react-native';
import { fieldBox } from '@/components/ui/field-box';
import { FieldShell, fieldAria, type FieldShellProps } from '@/components/ui/field-shell';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { radius, textSizes } from '@/components/ui/theme/metrics';
import { sansFace } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props extends FieldShellProps {
  readonly value: readonly string[];
  readonly onChange: (value: string[]) => void;
  /** The most tags; further ones are not taken. */
  readonly most?: number;
  readonly placeholder?: string;
}

/** Short words about a thing. Enter, a comma or leaving the field adds one; Backspace in the empty field takes the last off. */
export function TagsField(props: Props) {
  const {
    label,
    hideLabel,
    hint = 'Enter or a comma adds a tag.',
    error,
    value,
    onChange,
    most = 20,
    placeholder,
  } = props;
  const colours = useColours();
  const id = useId();
  const [typed, setTyped] = useState('');
  const shell = { label, hideLabel, hint, error };
  const add = (text: string) => {
    const words = text.split(',').map((word) => word.trim().replace(/\s+/g, ' '));
    const next = [...new Set([...value, ...words.filter((word) => word !== '')])].slice(0, most);
    setTyped('');
    if (next.length !== value.length) onChange(next);
  };
  const remove = (tag: string) => onChange(value.filter((other) => other !== tag));
  return (
    <FieldShell {...shell} controlId={id}>
      <View
        style={[
          fieldBox(colours, error !== undefined && error !== ''),
          { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 6, paddingVertical: 7 },
        ]}
      >
        {value.map((tag) => (
          <View
            key={tag}
            style={{
              flexDirection: 'row',
              alignItems: 'center',
              height: 32,
              paddingLeft: 10,
              borderRadius: radius.chip,
              backgroundColor: colours.well,
            }}
          >
            <Txt size="row">{tag}</Txt>
            <Pressable
              role="button"
              aria-label={`Take off ${tag}`}
              onPress={() => remove(tag)}
              style={{
                width: 32,
                height: 32,
                alignItems: 'center',
                justifyContent: 'center',
                borderRadius: radius.chip,
              }}
            >
              <Icon name="close" size={14} colour="inkSoft" />
            </Pressable>
          </View>
        ))}
        <TextInput
          {...fieldAria(id, shell)}
          id={id}
          value={typed}
          placeholder={value.length === 0 ? placeholder : undefined}
          placeholderTextColor={colours.inkSoft}
          autoCapitalize="none"
          enterKeyHint="enter"
          submitBehavior="submit"
          onChangeText={(text) => (text.includes(',') ? add(text) : setTyped(text))}
          onBlur={() => add(typed)}
          onKeyPress={({ nativeEvent }) => {
            const last = value.at(-1);
            if (nativeEvent.key === 'Backspace' && typed === '' && last !== undefined) remove(last);
          }}
          onSubmitEditing={() => add(typed)}
          style={[
            textSizes.body,
            sansFace('regular'),
            { flexGrow: 1, flexBasis: 90, minWidth: 90, height: 32, color: colours.ink, borderRadius: 4 },
          ]}
        />
      </View>
    </FieldShell>
  );
}
