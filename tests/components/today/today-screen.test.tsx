import { fireEvent, screen } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { TodayScreen } from '@/components/today/today-screen';
import { renderScreen, setWidth } from '@/tests/components/support/render-screen';
import { ids, sampleMe } from '@/tests/components/support/sample-journal';
import { type Today, type TodayTask } from '@/shared/today/today-endpoints';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

const task = (changes: Partial<TodayTask>): TodayTask => ({
  kind: 'start',
  group: 'from-today',
  title: 'Something',
  why: 'A reason.',
  profit: null,
  action: 'Do it',
  target: { kind: 'new-plan' },
  ...changes,
});

async function show(tasks: TodayTask[]) {
  const today: Today = {
    now: '2026-12-09T22:20:00.000Z',
    session: { sessionDate: '2026-12-09', isOver: true },
    nextSession: { sessionDate: '2026-12-10', kind: 'full' },
    tasks,
    running: [],
    runningCount: 0,
    resolvedOddsCount: 3,
    meanBrierScore: null,
  };
  setWidth(390);
  renderScreen(<TodayScreen />, { 'GET /today': today, 'GET /account/me': sampleMe });
  await screen.findByRole('heading', { name: 'How your odds are doing' });
}

const entry = { kind: 'entry', entryId: ids.entry, section: 'lesson' } as const;

describe('a line of Today', () => {
  it.each([
    ['a draft', task({ kind: 'seal-draft', target: entry }), `/plan/${ids.entry}`],
    ['a missing lesson', task({ kind: 'write-lesson', target: entry }), `/journal/${ids.entry}?section=lesson`],
    [
      'missing prices',
      task({
        kind: 'missing-prices',
        target: { kind: 'underlying', underlyingId: ids.underlying, sessionDate: null },
      }),
      `/prices/${ids.underlying}/upload`,
    ],
    [
      'a missing settlement value',
      task({
        kind: 'missing-settlement',
        target: { kind: 'underlying', underlyingId: ids.underlying, sessionDate: '2026-12-18' },
      }),
      `/prices/${ids.underlying}?session=2026-12-18`,
    ],
    ['the week that ended', task({ kind: 'weekly-review', target: { kind: 'weekly-review' } }), '/review'],
    ['the first underlying', task({ target: { kind: 'new-underlying' } }), '/prices/new'],
    ['the first plan', task({}), '/plan/new'],
  ])('leads from %s to where it is done', async (_, line, address) => {
    await show([line]);
    expect(screen.getByRole('link', { name: /Something/ }).getAttribute('href')).toBe(address);
  });

  it('says its dates in words', async () => {
    await show([task({ title: 'ZZIX stops at 2026-11-30' })]);
    expect(screen.getByText('ZZIX stops at 30 Nov')).toBeTruthy();
  });
});

describe('a closed entry on Today', () => {
  it('says what it brought, and what of its odds is answered', async () => {
    await show([
      task({
        kind: 'write-lesson',
        target: entry,
        profit: { realised: '-318.35', currency: 'USD' },
        why: '3 of 4 odds are answered. The lesson is still blank.',
      }),
    ]);
    expect(screen.getByText('−318.35 USD; 3 of 4 odds are answered. The lesson is still blank.')).toBeTruthy();
  });
});

describe('Today', () => {
  it('shows the first of many lines, and the rest when asked', async () => {
    await show(Array.from({ length: 14 }, (_, index) => task({ title: `Line ${index + 1}` })));
    expect(screen.getAllByRole('link', { name: /^Line/ })).toHaveLength(6);
    fireEvent.click(screen.getByRole('button', { name: 'Show 8 more' }));
    expect(screen.getAllByRole('link', { name: /^Line/ })).toHaveLength(14);
  });

  it('says so when nothing waits', async () => {
    await show([]);
    expect(await screen.findByText('Nothing waits for you')).toBeTruthy();
  });
});
