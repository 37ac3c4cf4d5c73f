import { Pressable, View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useArrowKeys } from '@/components/ui/use-arrow-keys';

interface Props {
  readonly label?: string;
  readonly steps: readonly string[];
  readonly current: number;
  /** The last step that can be opened. */
  readonly reached: number;
  readonly onGo: (step: number) => void;
}

/** The steps of a long form; any reached one can be opened again. */
export function StepBar({ label = 'Steps', steps, current, reached, onGo }: Props) {
  const colours = useColours();
  const { onKeyDown, itemRef } = useArrowKeys({
    count: steps.length,
    current,
    onMove: onGo,
    isOpen: (index) => index <= reached,
  });
  return (
    <View role="tablist" aria-label={label} {...{ onKeyDown }} style={{ flexDirection: 'row', gap: 6 }}>
      {steps.map((step, index) => {
        const isCurrent = index === current;
        return (
          <Pressable
            key={step}
            ref={itemRef(index)}
            role="tab"
            aria-selected={isCurrent}
            disabled={index > reached}
            {...{ tabIndex: isCurrent ? 0 : -1 }}
            onPress={() => onGo(index)}
            style={{ flex: 1, minWidth: 0, minHeight: sizes.target, justifyContent: 'center', gap: 6 }}
          >
            <View
              style={{
                height: 4,
                borderRadius: 2,
                opacity: index < current ? 0.55 : 1,
                backgroundColor: index <= current ? colours.bramble : colours.rule,
              }}
            />
            <Txt
              size="note"
              weight={isCurrent ? 'semibold' : 'medium'}
              colour={isCurrent ? 'bramble' : 'inkSoft'}
              numberOfLines={1}
            >
              {step}
            </Txt>
          </Pressable>
        );
      })}
    </View>
  );
}
