import { screen, within } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { ScoresScreen } from '@/components/scores/scores-screen';
import { renderScreen } from '@/tests/components/support/render-screen';
import { ids } from '@/tests/components/support/sample-journal';
import { type Scores } from '@/shared/scores/score-endpoints';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

const resolved = (count: number): Scores['resolved'] =>
  Array.from({ length: count }, (_, index) => ({
    entryId: ids.entry,
    symbol: 'ZZIX',
    structureName: 'long 1540 call',
    traderName: 'Ada Thorn',
    key: `odds-${index}`,
    statement: '1540 call in the money',
    dueSessionDate: '2026-12-23',
    probability: 0.42,
    marketImplied: null,
    happened: true,
    brierScore: 0.3364,
    isLateSeal: false,
  }));

const show = (scores: Scores) => renderScreen(<ScoresScreen />, { 'GET /scores': scores });
const few: Scores = {
  resolved: resolved(3),
  count: 3,
  lateCount: 0,
  pendingCount: 2,
  sampleRule: 'list-only',
  summary: null,
};

describe('scores', () => {
  it('are a count and a list without any rate under 20 resolved odds', async () => {
    show(few);
    await screen.findByText(/^3 odds are resolved\. Rates are shown from 20 on/);
    expect(screen.queryByText('Calibration')).toBeNull();
    expect(screen.queryByText('Brier score')).toBeNull();
    const table = screen.getByRole('table', { name: 'Resolved forecasts' });
    expect(within(table).getAllByRole('link')).toHaveLength(3);
    expect(within(table).getAllByRole('link')[0]?.getAttribute('href')).toBe(`/journal/${ids.entry}`);
  });

  it('begin with their sentence from 20 on', async () => {
    const summary: Scores['summary'] = {
      meanBrierScore: 0.193,
      marketMeanBrierScore: null,
      meanLogScore: 0.57,
      baseRate: 0.35,
      reliability: 0.01,
      resolution: 0.04,
      uncertainty: 0.2275,
      bins: [{ forecast: 0.42, observed: 0.4, count: 24, low: 0.3, high: 0.6 }],
      curve: [{ forecast: 0.42, observed: 0.4 }],
      sentence: 'Your 40% calls came in 40% of the time over 24 cases.',
    };
    show({ ...few, resolved: resolved(24), count: 24, sampleRule: 'shown', summary });
    await screen.findByText('Your 40% calls came in 40% of the time over 24 cases.');
    expect(screen.getByText('0.193')).toBeTruthy();
  });

  it('say why there is none yet', async () => {
    show({ ...few, resolved: [], count: 0 });
    await screen.findByText('No odds are resolved yet');
    expect(screen.queryByRole('table')).toBeNull();
  });
});
