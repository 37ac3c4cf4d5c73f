import { useEffect, useRef, useState } from 'react';
import { Pressable, ScrollView, View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

interface Section {
  /** Id of the section's heading. */
  readonly anchor: string;
  readonly label: string;
}

interface Props {
  readonly label: string;
  readonly sections: readonly Section[];
}

/** A heading this far down, in points, still counts as the one being read. */
const READING_LINE = 200;

/** Moves the reader to a heading: it is scrolled to and takes the focus, so that reading goes on there. */
export function focusHeading(anchor: string): void {
  const heading = document.getElementById(anchor);
  heading?.scrollIntoView?.({ block: 'start' });
  heading?.focus({ preventScroll: true });
}

/** Links to the sections of a long page; the one being read is marked. */
export function SectionLinks({ label, sections }: Props) {
  const colours = useColours();
  const { current, jumpTo } = useCurrentSection(sections);
  return (
    <View
      role="navigation"
      aria-label={label}
      style={{ backgroundColor: colours.paper, borderBottomWidth: 1, borderColor: colours.rule }}
    >
      <ScrollView horizontal showsHorizontalScrollIndicator={false} contentContainerStyle={{ gap: 4 }}>
        {sections.map((section) => {
          const isCurrent = section.anchor === current;
          return (
            <Pressable
              key={section.anchor}
              role="link"
              {...{ href: `#${section.anchor}` }}
              {...(isCurrent ? { 'aria-current': 'location' as const } : {})}
              onPress={(event) => {
                event.preventDefault();
                jumpTo(section.anchor);
              }}
              style={{
                minHeight: sizes.target,
                paddingHorizontal: 10,
                justifyContent: 'center',
                borderBottomWidth: 2,
                borderColor: isCurrent ? colours.bramble : 'transparent',
              }}
            >
              <Txt size="row" weight={isCurrent ? 'semibold' : 'medium'} colour={isCurrent ? 'bramble' : 'ink'}>
                {section.label}
              </Txt>
            </Pressable>
          );
        })}
      </ScrollView>
    </View>
  );
}

function useCurrentSection(sections: readonly Section[]): { current: string; jumpTo: (anchor: string) => void } {
  const [current, setCurrent] = useState(sections[0]?.anchor ?? '');
  // A jump near the end of the page cannot bring its heading to the top: what was chosen stays marked until a person scrolls.
  const isJump = useRef(false);
  useEffect(() => {
    const onScroll = ({ target }: Event) => {
      // The row of links scrolls too.
      if (target instanceof Element && target.closest('nav') !== null) return;
      if (isJump.current) {
        isJump.current = false;
        return;
      }
      const passed = sections.filter(({ anchor }) => topOf(anchor) <= READING_LINE);
      const top = Math.max(...passed.map(({ anchor }) => topOf(anchor)));
      // Of two side by side the first is named.
      setCurrent(passed.find(({ anchor }) => topOf(anchor) === top)?.anchor ?? sections[0]?.anchor ?? '');
    };
    document.addEventListener('scroll', onScroll, { capture: true, passive: true });
    return () => document.removeEventListener('scroll', onScroll, { capture: true });
  }, [sections]);
  // On a narrow screen the row is longer than what shows of it.
  useEffect(() => {
    document.querySelector(`a[href="#${current}"]`)?.scrollIntoView?.({ block: 'nearest', inline: 'nearest' });
  }, [current]);
  const jumpTo = (anchor: string) => {
    isJump.current = true;
    setCurrent(anchor);
    focusHeading(anchor);
  };
  return { current, jumpTo };
}

const topOf = (anchor: string): number => document.getElementById(anchor)?.getBoundingClientRect().top ?? Infinity;
