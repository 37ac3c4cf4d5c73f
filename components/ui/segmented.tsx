import { useId } from 'react';
import { Pressable, View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { radius, sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useArrowKeys } from '@/components/ui/use-arrow-keys';

interface Props<V extends string> {
  readonly label: string;
  readonly hideLabel?: boolean;
  readonly options: readonly { readonly value: V; readonly label: string }[];
  readonly value: V;
  readonly onChange: (value: V) => void;
  readonly disabled?: boolean;
}

/** A few choices side by side, one of them chosen: a radio group. */
export function Segmented<V extends string>({
  label,
  hideLabel = false,
  options,
  value,
  onChange,
  disabled = false,
}: Props<V>) {
  const colours = useColours();
  const labelId = useId();
  const chosen = options.findIndex((option) => option.value === value);
  const { onKeyDown, itemRef } = useArrowKeys({
    count: options.length,
    current: chosen,
    onMove: (index) => {
      const option = options[index];
      if (option !== undefined && !disabled) onChange(option.value);
    },
  });
  return (
    <View style={{ gap: 4 }}>
      {hideLabel ? null : (
        <Txt id={labelId} size="row" weight="medium">
          {label}
        </Txt>
      )}
      <View
        role="radiogroup"
        {...(hideLabel ? { 'aria-label': label } : { 'aria-labelledby': labelId })}
        {...{ onKeyDown }}
        style={{ flexDirection: 'row', borderWidth: 1, borderColor: colours.edge, borderRadius: radius.control }}
      >
        {options.map((option, index) => {
          const isChosen = index === chosen;
          return (
            <Pressable
              key={option.value}
              ref={itemRef(index)}
              role="radio"
              aria-checked={isChosen}
              disabled={disabled}
              {...{ tabIndex: isChosen || (chosen < 0 && index === 0) ? 0 : -1 }}
              onPress={() => onChange(option.value)}
              style={{
                flexGrow: 1,
                flexShrink: 1,
                flexBasis: 0,
                minHeight: sizes.target - 2,
                paddingHorizontal: 6,
                paddingVertical: 4,
                alignItems: 'center',
                justifyContent: 'center',
                borderLeftWidth: index === 0 ? 0 : 1,
                borderColor: colours.rule,
                backgroundColor: isChosen ? colours.brambleWash : colours.sheet,
                borderTopLeftRadius: index === 0 ? radius.control - 1 : 0,
                borderBottomLeftRadius: index === 0 ? radius.control - 1 : 0,
                borderTopRightRadius: index === options.length - 1 ? radius.control - 1 : 0,
                borderBottomRightRadius: index === options.length - 1 ? radius.control - 1 : 0,
              }}
            >
              <Txt
                size="row"
                weight={isChosen ? 'semibold' : 'medium'}
                colour={disabled ? 'inkSoft' : isChosen ? 'bramble' : 'ink'}
                align="center"
              >
                {option.label}
              </Txt>
            </Pressable>
          );
        })}
      </View>
    </View>
  );
}
