import { usePathname } from 'expo-router';
import { useCallback, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { BottomBar } from '@/components/frame/bottom-bar';
import { FrameContext } from '@/components/frame/frame-context';
import { type PlaceKey } from '@/components/frame/places';
import { Rail } from '@/components/frame/rail';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface Props {
  readonly person?: { readonly displayName: string; readonly deskName: string };
  /** How many things wait at a place; none or 0 shows nothing. */
  readonly badges?: Partial<Record<PlaceKey, number>>;
  readonly children: ReactNode;
}

/** What stands around every screen after sign-in: the five places at the left, or at the foot of a phone. */
export function AppFrame({ person, badges = {}, children }: Props) {
  const colours = useColours();
  const isWide = useLayout().kind === 'wide';
  const [covers, setCovers] = useState(0);
  const coverBottomBar = useCallback(() => {
    setCovers((count) => count + 1);
    return () => setCovers((count) => count - 1);
  }, []);
  const frame = useMemo(() => ({ coverBottomBar }), [coverBottomBar]);
  useFocusAfterNavigation();
  return (
    <FrameContext value={frame}>
      <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column', backgroundColor: colours.paper }}>
        <SkipLink />
        {isWide ? <Rail person={person} badges={badges} /> : null}
        <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>{children}</View>
        {isWide || covers > 0 ? null : <BottomBar badges={badges} />}
      </View>
    </FrameContext>
  );
}

const focusMain = () => document.querySelector<HTMLElement>('main')?.focus();

function SkipLink() {
  return (
    <a
      className="skip-link"
      href="#main"
      onClick={(event) => {
        event.preventDefault();
        focusMain();
      }}
    >
      Skip to content
    </a>
  );
}

/** When the pressed link went away with its screen, the focus goes to the new one instead of the top of the page. */
function useFocusAfterNavigation(): void {
  const pathname = usePathname();
  const last = useRef(pathname);
  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    if (document.activeElement === null || document.activeElement === document.body) focusMain();
  }, [pathname]);
}
