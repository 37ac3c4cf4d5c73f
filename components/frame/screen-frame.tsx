import { useContext, useEffect, useLayoutEffect, type ReactNode } from 'react';
import { ScrollView, View, type ViewStyle } from 'react-native';
import { BesideListContext, FrameContext } from '@/components/frame/frame-context';
import { Button } from '@/components/ui/button';
import { Heading, Txt } from '@/components/ui/text';
import { sizes, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface Props {
  /** Of the page and of the browser's tab. */
  readonly title: string;
  /** Where the arrow leads; not shown beside the list it would lead to. */
  readonly back?: { readonly label: string; readonly onPress: () => unknown };
  /** Under the title: words, or a small part of its own. */
  readonly note?: ReactNode;
  /** At most one on a phone. */
  readonly action?: ReactNode;
  /** Between title and content, over the whole width. */
  readonly head?: ReactNode;
  /** Links to the sections of a long page; they stay in sight while it scrolls. */
  readonly sections?: ReactNode;
  /** A form whose own bar takes the place of the bottom bar. */
  readonly hideBottomBar?: boolean;
  /** False for a screen that scrolls inside itself. */
  readonly scrolls?: boolean;
  readonly children: ReactNode;
}

/** One screen: its title in page and tab, the way back, an action, and the content as the main landmark. */
export function ScreenFrame({ hideBottomBar = false, scrolls = true, children, ...top }: Props) {
  const isWide = useLayout().kind === 'wide';
  useDocumentTitle(top.title);
  useCoveredBottomBar(hideBottomBar);
  const gutter = isWide ? space.gutterWide : space.gutterPhone;
  const head = top.head === undefined ? null : <View style={{ paddingBottom: space.cardGap }}>{top.head}</View>;
  if (!scrolls) {
    return (
      <Main>
        <TopBar {...top} />
        <View style={{ flex: 1, minHeight: 0, paddingHorizontal: gutter }}>
          {head}
          {children}
        </View>
      </Main>
    );
  }
  const links = top.sections === undefined ? null : <View style={{ paddingHorizontal: gutter }}>{top.sections}</View>;
  const body = { paddingHorizontal: gutter, paddingTop: links === null ? 4 : 16, paddingBottom: isWide ? 40 : 24 };
  if (isWide && links !== null) {
    // The title goes away with the page; the links stay.
    return (
      <Main>
        <ScrollView style={{ flex: 1 }} stickyHeaderIndices={[1]}>
          <View>
            <TopBar {...top} />
            <View style={{ paddingHorizontal: gutter }}>{head}</View>
          </View>
          {links}
          <View style={body}>{children}</View>
        </ScrollView>
      </Main>
    );
  }
  return (
    <Main>
      <ScrollView style={{ flex: 1 }} stickyHeaderIndices={isWide ? undefined : [0]}>
        {links === null ? (
          <TopBar {...top} />
        ) : (
          <View>
            <TopBar {...top} />
            {links}
          </View>
        )}
        <View style={body}>
          {head}
          {children}
        </View>
      </ScrollView>
    </Main>
  );
}

function Main({ children }: { children: ReactNode }) {
  return (
    <View role="main" id="main" {...{ tabIndex: -1 }} style={{ flex: 1, minHeight: 0, minWidth: 0 }}>
      {children}
    </View>
  );
}

function TopBar({ title, back, note, action }: Pick<Props, 'title' | 'back' | 'note' | 'action'>) {
  const colours = useColours();
  const isWide = useLayout().kind === 'wide';
  const isBesideList = useContext(BesideListContext);
  const hasBack = back !== undefined && !(isBesideList && isWide);
  const titleSize = isWide ? (hasBack || isBesideList ? 'title' : 'figure') : hasBack ? 'head' : 'title';
  const bar: ViewStyle = isWide
    ? { paddingTop: 24, paddingBottom: 16, paddingHorizontal: space.gutterWide }
    : { minHeight: sizes.topBar, paddingVertical: 10, paddingHorizontal: space.gutterPhone };
  return (
    <View style={[bar, { flexDirection: 'row', alignItems: 'center', gap: 8, backgroundColor: colours.paper }]}>
      {hasBack ? (
        <View style={{ marginLeft: -10 }}>
          <Button
            kind="text"
            iconOnly
            icon="back"
            label={back.label === 'Back' ? 'Back' : `Back to ${back.label}`}
            onPress={back.onPress}
          />
        </View>
      ) : null}
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
        <Heading level={1} size={titleSize} numberOfLines={2}>
          {title}
        </Heading>
        {typeof note === 'string' ? (
          <Txt size={isWide ? 'row' : 'note'} colour="inkSoft">
            {note}
          </Txt>
        ) : (
          note
        )}
      </View>
      {action}
    </View>
  );
}

function useDocumentTitle(title: string): void {
  useEffect(() => {
    document.title = `${title} · Brierbook`;
  }, [title]);
}

function useCoveredBottomBar(isCovered: boolean): void {
  const { coverBottomBar } = useContext(FrameContext);
  useLayoutEffect(() => (isCovered ? coverBottomBar() : undefined), [isCovered, coverBottomBar]);
}
