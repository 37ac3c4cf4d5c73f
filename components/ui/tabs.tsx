import { useId, type ReactNode } from 'react';
import { Pressable, ScrollView, View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useArrowKeys } from '@/components/ui/use-arrow-keys';

interface Props<K extends string> {
  readonly label: string;
  readonly tabs: readonly { readonly key: K; readonly label: string }[];
  readonly value: K;
  readonly onChange: (key: K) => void;
  /** What the chosen tab shows. */
  readonly children?: ReactNode;
}

/** Parts of one thing, one shown at a time; the row scrolls sideways when it is too narrow. */
export function Tabs<K extends string>({ label, tabs, value, onChange, children }: Props<K>) {
  const colours = useColours();
  const id = useId();
  const { onKeyDown, itemRef } = useArrowKeys({
    count: tabs.length,
    current: tabs.findIndex((tab) => tab.key === value),
    onMove: (index) => {
      const tab = tabs[index];
      if (tab !== undefined) onChange(tab.key);
    },
  });
  return (
    <View style={{ gap: 16 }}>
      <ScrollView
        horizontal
        showsHorizontalScrollIndicator={false}
        style={{ flexGrow: 0 }}
        contentContainerStyle={{ flexGrow: 1 }}
      >
        <View
          role="tablist"
          aria-label={label}
          {...{ onKeyDown }}
          style={{ flexDirection: 'row', flexGrow: 1, borderBottomWidth: 1, borderColor: colours.rule }}
        >
          {tabs.map((tab, index) => {
            const isChosen = tab.key === value;
            return (
              <Pressable
                key={tab.key}
                ref={itemRef(index)}
                id={`${id}-${tab.key}`}
                role="tab"
                aria-selected={isChosen}
                {...{ 'aria-controls': isChosen ? `${id}-panel` : undefined, tabIndex: isChosen ? 0 : -1 }}
                onPress={() => onChange(tab.key)}
                style={{
                  minHeight: sizes.target,
                  paddingHorizontal: 12,
                  justifyContent: 'center',
                  borderBottomWidth: 2,
                  marginBottom: -1,
                  borderColor: isChosen ? colours.bramble : 'transparent',
                }}
              >
                <Txt size="row" weight={isChosen ? 'semibold' : 'medium'} colour={isChosen ? 'bramble' : 'inkSoft'}>
                  {tab.label}
                </Txt>
              </Pressable>
            );
          })}
        </View>
      </ScrollView>
      {children === undefined ? null : (
        <View role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${value}`}>
          {children}
        </View>
      )}
    </View>
  );
}
