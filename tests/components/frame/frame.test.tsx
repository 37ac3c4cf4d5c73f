import { act, render, screen } from '@testing-library/react';
import type * as React from 'react';
import { AppFrame } from '@/components/frame/app-frame';
import { ListDetail } from '@/components/frame/list-detail';
import { placeOf } from '@/components/frame/places';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { Txt } from '@/components/ui/text';

// The frame only asks the router where it is; its links are plain ones here.
jest.mock('expo-router', () => {
  const { cloneElement } = jest.requireActual<typeof React>('react');
  return {
    usePathname: () => '/plan/0193',
    Link: ({ href, children }: { href: string; children: React.ReactElement<{ href?: string }> }) =>
      cloneElement(children, { href }),
  };
});

const text = <Txt>text</Txt>;
const rows = <Txt>the rows</Txt>;
const person = { displayName: 'Mara Quill', deskName: 'Alder Lane' };

function setWidth(width: number): void {
  Object.defineProperty(document.documentElement, 'clientWidth', { configurable: true, value: width });
  act(() => void window.dispatchEvent(new Event('resize')));
}

describe.each([
  ['phone', 390],
  ['wide', 1440],
])('the frame on a %s screen', (_, width) => {
  beforeEach(() => setWidth(width));

  it('leads to the five places and marks the one the address belongs to', () => {
    render(
      <AppFrame person={person} badges={{ today: 6 }}>
        <ScreenFrame title="Plan a trade">{text}</ScreenFrame>
      </AppFrame>,
    );
    const navigation = screen.getByRole('navigation', { name: 'Places' });
    const links = [...navigation.querySelectorAll('a')].slice(0, 5);
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/', '/journal', '/prices', '/scores', '/desk']);
    expect(
      links.filter((link) => link.getAttribute('aria-current') === 'page').map((link) => link.textContent),
    ).toEqual(['Journal']);
    expect(links[0]?.textContent).toContain('6 waiting');
  });

  it('names page and tab by the title of the screen, in one main landmark', () => {
    render(
      <AppFrame>
        <ScreenFrame title="Plan a trade">{text}</ScreenFrame>
      </AppFrame>,
    );
    expect(screen.getByRole('heading', { level: 1, name: 'Plan a trade' })).toBeTruthy();
    expect(document.title).toBe('Plan a trade · Brierbook');
    expect(screen.getAllByRole('main')).toHaveLength(1);
  });
});

describe('the bottom bar', () => {
  it('gives way to the bar of a form, and comes back after it', () => {
    setWidth(390);
    const page = (hides: boolean) => (
      <AppFrame>
        <ScreenFrame title="Plan" hideBottomBar={hides}>
          {text}
        </ScreenFrame>
      </AppFrame>
    );
    const { rerender } = render(page(true));
    expect(screen.queryByRole('navigation')).toBeNull();
    rerender(page(false));
    expect(screen.queryByRole('navigation')).not.toBeNull();
  });
});

describe('ListDetail', () => {
  const detail = (
    <ScreenFrame title="HVYQ 102 call" back={{ label: 'Journal', onPress: () => undefined }}>
      {text}
    </ScreenFrame>
  );

  it('shows the detail alone on a phone, with the way back', () => {
    setWidth(390);
    render(<ListDetail title="Journal" list={rows} detail={detail} />);
    expect(screen.queryByText('the rows')).toBeNull();
    expect(screen.getByRole('button', { name: 'Back to Journal' })).toBeTruthy();
  });

  it('shows both side by side when wide, without the way back to what is in sight', () => {
    setWidth(1440);
    render(<ListDetail title="Journal" list={rows} detail={detail} />);
    expect(screen.getByRole('region', { name: 'Journal' }).textContent).toBe('the rows');
    expect(screen.queryByRole('button', { name: 'Back to Journal' })).toBeNull();
    expect(screen.getAllByRole('main')).toHaveLength(1);
  });

  it('makes the list the main landmark and names the tab after it while nothing is chosen', () => {
    setWidth(1440);
    render(<ListDetail title="Journal" list={rows} detail={null} />);
    const list = screen.getByRole('region', { name: 'Journal' });
    expect(list.textContent).toBe('the rows');
    expect(screen.getByRole('main').contains(list)).toBe(true);
    expect(document.title).toBe('Journal · Brierbook');
  });
});

describe('placeOf', () => {
  it.each([
    ['/', 'today'],
    ['/journal/0193', 'journal'],
    ['/plan/new', 'journal'],
    ['/prices/0193/upload', 'prices'],
    ['/desk', 'desk'],
    ['/caution', null],
    ['/pricesheet', null],
  ])('of %s is %s', (pathname, place) => {
    expect(placeOf(pathname)).toBe(place);
  });
});
