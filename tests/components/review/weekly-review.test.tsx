import { act, fireEvent, screen, within } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { WeeklyReviewScreen } from '@/components/review/weekly-review-screen';
import { renderScreen, setWidth } from '@/tests/components/support/render-screen';
import { ids, sampleMe, sampleRow } from '@/tests/components/support/sample-journal';
import { type ReviewedWeek, type WeeklyReview } from '@/shared/reviews/weekly-review-endpoints';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

const ada = { id: ids.trader, displayName: 'Ada Thorn' };
const rule: WeeklyReview = {
  id: ids.upload,
  version: 2,
  weekStartSessionDate: '2026-11-30',
  action: 'change',
  rule: 'If the limit is not met, then one more quote and no third.',
  evidence: 'Two of three fills were past the limit.',
  followedLast: null,
  savedAt: '2026-12-05T15:00:00.000Z',
};
const emptyWeek: ReviewedWeek = {
  week: {
    startSessionDate: '2026-12-07',
    endSessionDate: '2026-12-11',
    isOver: true,
    previous: '2026-11-30',
    next: null,
  },
  trader: ada,
  traders: [ada],
  isOwn: true,
  sealed: [],
  closed: [],
  odds: [],
  meanBrierScore: null,
  process: [],
  profit: [],
  review: null,
  lastRule: null,
};
const fullWeek: ReviewedWeek = {
  ...emptyWeek,
  closed: [sampleRow({ state: 'closed', realisedProfit: '318.35' })],
  odds: [
    {
      entryId: ids.entry,
      key: 'call',
      entryName: 'ZZIX long 3 × 101 call',
      statement: '101 call in the money',
      probability: 0.42,
      marketImplied: null,
      happened: true,
      brierScore: 0.3364,
    },
  ],
  process: [
    { mark: 'sealed-before-fill', kept: 1, of: 1 },
    { mark: 'size', kept: 1, of: 1 },
    { mark: 'limit', kept: 0, of: 1 },
    { mark: 'exit', kept: 0, of: 0 },
  ],
  profit: [{ currency: 'USD', count: 1, expectedMean: -19.05, realised: '318.35' }],
};

async function show(view: ReviewedWeek, answers: Record<string, unknown> = {}) {
  setWidth(390);
  const made = renderScreen(<WeeklyReviewScreen />, {
    'GET /weekly-review': view,
    'GET /account/me': sampleMe,
    ...answers,
  });
  await screen.findByText(/^Mon 7 Dec to Fri 11 Dec 2026/);
  return made;
}

describe('a week looked back at', () => {
  it('shows profit expected and realised, marks as counts, and each answered odds with its score', async () => {
    await show(fullWeek);
    const profit = screen.getByRole('table', { name: 'Profit expected and realised' });
    expect(within(profit).getAllByRole('row')[1]?.textContent).toMatch(/^USD1−19\.05\+318\.35/);
    const marks = screen.getByRole('table', { name: 'How the plans were carried out' });
    expect(
      within(marks)
        .getAllByRole('row')
        .map(({ textContent }) => textContent),
    ).toEqual([
      expect.any(String),
      'Sealed before the first fill1 of 1',
      'Size inside the plan1 of 1',
      'Price inside the limit0 of 1',
      'Exit by a written rulenot known',
    ]);
    expect(screen.getByText('42% → yes')).toBeTruthy();
    expect(screen.getByRole('link', { name: /101 call in the money/ }).getAttribute('href')).toBe(
      `/journal/${ids.entry}?section=odds`,
    );
  });

  it('gives no rate and no mean from fewer than 20 cases', async () => {
    await show(fullWeek);
    expect(screen.getByText('1 answered; a mean score is shown from 20 on')).toBeTruthy();
    const percents = screen.queryAllByText(/\d%/).map(({ textContent }) => textContent);
    expect(percents).toEqual(['42% → yes']);
  });

  it('says that nothing happened, and takes a rule all the same', async () => {
    await show(emptyWeek);
    expect(screen.getByText('Nothing happened in this week')).toBeTruthy();
    expect(screen.getByRole('textbox', { name: 'The rule' })).toBeTruthy();
  });

  it('leads to the weeks beside it', async () => {
    await show({ ...fullWeek, week: { ...fullWeek.week, next: '2026-12-14' } });
    expect(screen.getByRole('link', { name: 'Week before' }).getAttribute('href')).toBe('/review?week=2026-11-30');
    expect(screen.getByRole('link', { name: 'Week after' }).getAttribute('href')).toBe('/review?week=2026-12-14');
  });
});

describe('the one rule', () => {
  const written = () => {
    fireEvent.change(screen.getByRole('textbox', { name: 'The rule' }), { target: { value: 'If late, then skip.' } });
    fireEvent.change(screen.getByRole('textbox', { name: 'Evidence' }), { target: { value: 'One of one.' } });
  };

  it('is saved once it has words and evidence', async () => {
    const { calls } = await show(fullWeek, { 'POST /weekly-reviews': fullWeek });
    const save = screen.getByRole('button', { name: 'Save rule' });
    expect(save.getAttribute('aria-disabled')).toBe('true');
    written();
    await act(async () => {
      fireEvent.click(screen.getByRole('button', { name: 'Save rule' }));
    });
    expect(calls).toContain('POST /weekly-reviews');
  });

  it('of the week before is shown, and asked about', async () => {
    await show({ ...fullWeek, lastRule: rule });
    expect(screen.getByText('The rule of the week from 30 November 2026')).toBeTruthy();
    expect(screen.getByText(/one more quote and no third/)).toBeTruthy();
    fireEvent.click(within(screen.getByRole('radiogroup', { name: 'Did you follow it?' })).getByText('Partly'));
    expect(screen.getByRole('radio', { name: 'Partly' }).getAttribute('aria-checked')).toBe('true');
  });

  it('that is written is read first, and edited from the version that was seen', async () => {
    const { calls } = await show(
      { ...fullWeek, review: { ...rule, weekStartSessionDate: '2026-12-07', followedLast: 'yes' }, lastRule: rule },
      { [`PUT /weekly-reviews/${ids.upload}`]: fullWeek },
    );
    expect(screen.queryByRole('textbox')).toBeNull();
    expect(screen.getByText('The rule before was followed: yes.')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Edit' }));
    written();
    await act(async () => {
      fireEvent.click(screen.getByRole('button', { name: 'Save rule' }));
    });
    expect(calls).toContain(`PUT /weekly-reviews/${ids.upload}`);
  });

  it('keeps what was typed when the server refuses it', async () => {
    await show(fullWeek);
    written();
    await act(async () => {
      fireEvent.click(screen.getByRole('button', { name: 'Save rule' }));
    });
    await screen.findByText(/Your text is still here\.$/);
    expect(screen.getByDisplayValue('If late, then skip.')).toBeTruthy();
  });

  it('of another trader is read only', async () => {
    await show({ ...fullWeek, isOwn: false, review: null });
    expect(screen.getByText('Not written yet.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Save rule' })).toBeNull();
  });
});
