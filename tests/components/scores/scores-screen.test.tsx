import { fireEvent, screen, within } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { ScoresScreen } from '@/components/scores/scores-screen';
import { renderScreen } from '@/tests/components/support/render-screen';
import { ids } from '@/tests/components/support/sample-journal';
import { fewScores, richScores } from '@/tests/components/support/sample-scores';
import { type ScoreFilter } from '@/shared/scores/score-filter';
import { type Scores } from '@/shared/scores/scores';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

function show(scores: Scores, filter: ScoreFilter = {}): { chosen: ScoreFilter[] } {
  const chosen: ScoreFilter[] = [];
  renderScreen(<ScoresScreen filter={filter} onFilter={(next) => chosen.push(next)} />, { 'GET /scores': scores });
  return { chosen };
}

describe('scores', () => {
  it('say why there is none yet', async () => {
    show({ ...fewScores, resolved: [], resolvedCount: 0, entries: [], odds: { ...fewScores.odds, count: 0 } });
    await screen.findByText('No odds are resolved yet');
    expect(screen.queryByRole('table')).toBeNull();
  });

  it('say that nothing fits, and lead back, when filters leave none', async () => {
    const none = { ...fewScores, resolved: [], resolvedCount: 0, entries: [] };
    const { chosen } = show(none, { tag: 'calm' });
    await screen.findByText('Nothing resolved fits');
    fireEvent.click(screen.getAllByRole('button', { name: 'Show all' })[0] as HTMLElement); // getAllBy gives one at least
    expect(chosen).toEqual([{}]);
  });

  it('are counts and a list without any rate under 20', async () => {
    show(fewScores);
    await screen.findByText('3 odds are resolved: cannot tell yet.');
    expect(screen.queryByText('Calibration')).toBeNull();
    expect(screen.queryByText('Brier score and its parts')).toBeNull();
    expect(screen.queryByRole('img')).toBeNull();
    expect(screen.getAllByText('3 moves: too few for a rate. Figures are shown from 20 on.')).toHaveLength(2);
    expect(screen.getByText('too few for a rate')).toBeTruthy();
    const table = screen.getByRole('table', { name: 'Resolved forecasts' });
    expect(within(table).getAllByRole('link')[0]?.getAttribute('href')).toBe(`/journal/${ids.entry}`);
  });

  it('make the sums of few only when asked by name, and say that they say nothing', async () => {
    const { chosen } = show(fewScores, { tag: 'calm' });
    fireEvent.click(await screen.findByRole('button', { name: 'Show the sums all the same' }));
    expect(chosen).toEqual([{ tag: 'calm', evenIfFew: 'yes' }]);
  });

  it('are marked provisional up to 50', async () => {
    show(richScores(34));
    await screen.findByText(/^Provisional: up to 50 cases/);
  });

  it('stand in their order, each graphic with words and a table', async () => {
    show(richScores(64));
    await screen.findByText(/^Your 70% calls came in 61%/);
    expect(screen.queryByText(/^Provisional/)).toBeNull();
    const heads = screen.getAllByRole('heading', { level: 2 }).map(({ textContent }) => textContent);
    expect(heads).toEqual([
      'Calibration',
      'Brier score and its parts',
      'Where outcomes fell in their forecasts',
      'Band coverage',
      'Volatility, realised over planned',
      'Expected and realised profit',
      'Where profits came from',
      'Plan and result',
      'By structure',
      'Resolved forecasts',
    ]);
    const pictures = screen.getAllByRole('img').map((picture) => picture.getAttribute('aria-label'));
    expect(pictures).toEqual([
      expect.stringContaining('Calibration of 64 resolved odds'),
      expect.stringContaining('Outcomes by eighth of their forecast'),
      expect.stringContaining('realised +1,977.60 USD'),
    ]);
    expect(screen.getAllByRole('button', { name: /^Show as table/ })).toHaveLength(5);
    expect(screen.getByText(/Yours are better by 0\.016; chance alone allows ±0\.020\./)).toBeTruthy();
    expect(
      screen.getByText(/Mean \+41\.20 USD an entry, 95% interval −48\.80 to \+131\.20: no edge shown yet\./),
    ).toBeTruthy();
    expect(screen.getByText(/z −0\.80/)).toBeTruthy();
  });

  it('turn to the log score and to profits', async () => {
    show(richScores(64));
    fireEvent.click(await screen.findByRole('radio', { name: 'Log' }));
    expect(screen.getByText(/Yours are worse by 0\.030/)).toBeTruthy();
    expect(screen.getByText(/2 odds under 0\.01% are scored as 0\.01%/)).toBeTruthy();
    fireEvent.click(screen.getByRole('radio', { name: 'Profits' }));
    expect(screen.getByText(/less than 0\.1% of the time \(chi-square/)).toBeTruthy();
  });

  it('speak of theirs to a mentor', async () => {
    show({ ...richScores(64), whose: 'mentored' });
    await screen.findByText(/Theirs are better by 0\.016/);
  });

  it('lead from a figure to its entries', async () => {
    show(richScores(64));
    fireEvent.click(await screen.findByRole('button', { name: 'Show 1 entry: moves beyond 1σ' }));
    const table = screen.getByRole('table', { name: 'Entries: moves beyond 1σ' });
    expect(within(table).getByRole('link').getAttribute('href')).toBe('/journal/01940000-0000-7000-8000-000000000000');
    expect(within(table).getByText('−1.40σ')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Show 1 entry: plans not followed' }));
    expect(screen.getByText('unplanned')).toBeTruthy();
  });

  it('narrow by a field, and by the name of a cut', async () => {
    const { chosen } = show(richScores(64), { traded: 'yes' });
    fireEvent.change(await screen.findByRole('combobox', { name: 'Horizon' }), { target: { value: '6-30' } });
    fireEvent.change(screen.getByRole('combobox', { name: 'Traded' }), { target: { value: '' } });
    fireEvent.click(screen.getByRole('button', { name: 'Bull put' }));
    fireEvent.click(screen.getByRole('radio', { name: 'Underlying' }));
    fireEvent.click(screen.getByRole('button', { name: 'ZZIX' }));
    expect(chosen).toEqual([
      { traded: 'yes', horizonClass: '6-30' },
      {},
      { traded: 'yes', structureKind: 'bull put' },
      { traded: 'yes', underlyingId: ids.underlying },
    ]);
  });
});
