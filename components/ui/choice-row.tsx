import { Pressable, View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly title: string;
  readonly detail?: string;
  readonly value?: string;
  readonly note?: string;
  readonly disabled?: boolean;
  readonly onPress: () => void;
}

/** A row of a list that leads somewhere: the whole row is one target. Belongs inside `role="list"`. */
export function ChoiceRow({ title, detail, value, note, disabled = false, onPress }: Props) {
  const colours = useColours();
  return (
    <View role="listitem">
      <Pressable
        role="button"
        disabled={disabled}
        onPress={onPress}
        style={({ pressed }) => ({
          flexDirection: 'row',
          alignItems: 'center',
          gap: 12,
          minHeight: sizes.target + 12,
          paddingVertical: 8,
          borderBottomWidth: 1,
          borderColor: colours.rule,
          backgroundColor: pressed ? colours.well : undefined,
        })}
      >
        <View style={{ flex: 1 }}>
          <Txt size="body" weight="semibold">
            {title}
          </Txt>
          {detail === undefined || detail === '' ? null : (
            <Txt size="row" colour="inkSoft">
              {detail}
            </Txt>
          )}
        </View>
        <View>
          {value === undefined ? null : (
            <Txt size="body" align="right">
              {value}
            </Txt>
          )}
          {note === undefined ? null : (
            <Txt size="note" colour="inkSoft" align="right">
              {note}
            </Txt>
          )}
        </View>
        <Icon name="chevron-right" size={18} colour="inkSoft" />
      </Pressable>
    </View>
  );
}
