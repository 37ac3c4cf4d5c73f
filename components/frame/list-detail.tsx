import { useEffect, type ReactNode } from 'react';
import { View, type ViewStyle } from 'react-native';
import { BesideListContext } from '@/components/frame/frame-context';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface Props {
  /** Names the list for screen readers, and the tab while no detail is open. */
  readonly title: string;
  readonly list: ReactNode;
  /** A screen of its own, with its main landmark; null while none is chosen. */
  readonly detail: ReactNode | null;
  /** What stands in the empty pane of a wide screen. */
  readonly placeholder?: string;
}

/** List and detail side by side when wide, one at a time below that. */
export function ListDetail({ title, list, detail, placeholder = 'Choose one at the left.' }: Props) {
  const colours = useColours();
  const isWide = useLayout().kind === 'wide';
  const hasDetail = detail !== null && detail !== undefined;
  useEffect(() => {
    if (!hasDetail) document.title = `${title} · Brierbook`;
  }, [hasDetail, title]);
  if (!isWide) {
    return hasDetail ? <BesideListContext value={false}>{detail}</BesideListContext> : <ListMain>{list}</ListMain>;
  }
  const Pair = hasDetail ? View : ListMain;
  return (
    <Pair style={{ flex: 1, flexDirection: 'row', minHeight: 0 }}>
      <View
        {...{ dataSet: { print: 'hide' } }}
        style={{ width: sizes.list, minHeight: 0, borderRightWidth: 1, borderColor: colours.rule }}
      >
        <View role="region" aria-label={title} style={{ flex: 1, minHeight: 0 }}>
          {list}
        </View>
      </View>
      <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>
        {hasDetail ? (
          <BesideListContext value>{detail}</BesideListContext>
        ) : (
          <View style={{ flex: 1, alignItems: 'center', justifyContent: 'center', padding: 32 }}>
            <Txt colour="inkSoft">{placeholder}</Txt>
          </View>
        )}
      </View>
    </Pair>
  );
}

function ListMain({ children, style }: { children: ReactNode; style?: ViewStyle }) {
  return (
    <View role="main" id="main" {...{ tabIndex: -1 }} style={[{ flex: 1, minHeight: 0 }, style]}>
      {children}
    </View>
  );
}
