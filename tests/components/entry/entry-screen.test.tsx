import { act, fireEvent, screen, within } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { EntryScreen } from '@/components/entry/entry-screen';
import { type EntrySection } from '@/components/entry/entry-sections';
import { CANNOT_TELL } from '@/journal/outcome/entry-outcome';
import { type Entry } from '@/shared/entries/entry';
import { renderScreen, setWidth } from '@/tests/components/support/render-screen';
import { ids, sampleFill, sampleMe, sampleSealed } from '@/tests/components/support/sample-journal';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

const sold = sampleFill({
  id: ids.upload,
  kind: 'sell',
  price: '1.50',
  cash: '448.05',
  tradedAt: '2026-12-14T15:30:00.000Z',
  sequence: 2,
});

/** A closed call whose odds at expiry wait for the last close. */
function closedEntry(changes: Partial<Entry> = {}): Entry {
  const entry = sampleSealed([sampleFill(), sold], {
    state: 'closed',
    firstFillAt: '2026-12-10T15:30:00.000Z',
    lastFillAt: '2026-12-14T15:30:00.000Z',
    realisedProfit: '86.10',
    needsLesson: true,
  });
  return {
    ...entry,
    outcome: {
      move: {
        sessionDate: '2026-12-14',
        pricedBy: 'close',
        sessions: 3,
        startPrice: 100,
        endPrice: 102,
        logReturn: 0.0198,
        inSigmas: 0.9,
        percentile: 0.819,
        studentPercentile: 0.804,
      },
      moveWaitsFor: null,
      moveSoFar: null,
      realisedVolatility: {
        dailyVolatility: 0.0134,
        low: 0.0076,
        high: 0.0501,
        sessions: 3,
        ratio: 0.9,
        ratioLow: 0.27,
        ratioHigh: 1.98,
      },
      odds: entry.sealed.forecast.odds.map((odds) => ({
        odds,
        happened: null,
        brierScore: null,
        marketBrierScore: null,
        logScore: null,
        waitsFor: 'the close of 2026-12-23',
        cannotTell: null,
        monitoredBy: null,
      })),
      profit: {
        realised: '86.10',
        fees: '3.90',
        isFinal: true,
        percentileLow: 0.7,
        percentileHigh: 0.7,
        horizon: 'expiry',
        expectedMean: -4,
      },
      sources: null,
      process: null,
      isComplete: false,
    },
    ...changes,
  };
}

async function show(
  entry: Entry,
  { section, at = '2026-12-24T22:00:00.000Z' }: { section?: EntrySection; at?: string } = {},
) {
  setWidth(390);
  jest.useFakeTimers({
    now: new Date(at),
    doNotFake: ['setTimeout', 'setInterval', 'queueMicrotask', 'setImmediate', 'performance'],
  });
  const answers = {
    [`GET /entries/${ids.entry}`]: entry,
    'GET /account/me': sampleMe,
    [`PUT /entries/${ids.entry}/lesson`]: {
      ...entry,
      lesson: 'Wait for the close.',
      row: { ...entry.row, state: 'reviewed', needsLesson: false },
    },
  };
  const made = renderScreen(<EntryScreen entryId={ids.entry} section={section} />, answers);
  await screen.findByRole('heading', { name: 'Sealed plan' });
  return made;
}
afterEach(() => jest.useRealTimers());

describe('the sections of an entry', () => {
  it('have a link each, in the order in which they stand on the page', async () => {
    await show(closedEntry());
    const links = within(screen.getByRole('navigation', { name: 'Sections of this entry' })).getAllByRole('link');
    expect(links.map(({ textContent }) => textContent)).toEqual([
      'Landing',
      'Odds',
      'Result',
      'Came from',
      'Process',
      'Fills',
      'Lesson',
      'Seal',
    ]);
    const headings = links.map((link) => {
      const heading = document.querySelector(link.getAttribute('href') ?? 'none');
      if (heading === null) throw new Error(`${link.textContent} leads nowhere.`);
      return heading;
    });
    for (const [index, heading] of headings.entries()) {
      expect(heading.getAttribute('role') ?? heading.tagName).toMatch(/heading|H2/);
      const next = headings[index + 1];
      if (next !== undefined)
        expect(heading.compareDocumentPosition(next) & Node.DOCUMENT_POSITION_FOLLOWING).toBeGreaterThan(0);
    }
  });

  it('take the focus when their link is followed, and the link is marked', async () => {
    await show(closedEntry());
    const link = screen.getByRole('link', { name: 'Fills' });
    fireEvent.click(link);
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Fills' }));
    expect(link.getAttribute('aria-current')).toBe('location');
    expect(screen.getByRole('link', { name: 'Landing' }).getAttribute('aria-current')).toBeNull();
  });

  it('are where the address points to: the focus goes there as soon as the entry is there', async () => {
    await show(closedEntry(), { section: 'fills' });
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Fills' }));
  });
});

describe('the result of an entry', () => {
  it('says the interval of the volatility and the place with the error of the estimate', async () => {
    await show(closedEntry());
    expect(
      screen.getByText(/what stood behind it: 0\.76% to 5\.01% \(95%\); ratio 0\.90; chance alone allows/),
    ).toBeTruthy();
    expect(screen.getByText(/82nd of 100 in its forecast, 80th of 100 with the error of its volatility/)).toBeTruthy();
    expect(screen.getByText(/^What one trade can show: little\./)).toBeTruthy();
  });
});

describe('what an entry waits for', () => {
  it('is said with the ways to bring it once it is due', async () => {
    await show(closedEntry());
    expect(screen.getByText('ZZIX: the close of 23 Dec')).toBeTruthy();
    const links = screen.getAllByRole('link', { name: 'Type the bar' });
    expect(links[0]?.getAttribute('href')).toBe(`/prices/${ids.underlying}?session=2026-12-14`);
    expect(links[1]?.getAttribute('href')).toBe(`/prices/${ids.underlying}?session=2026-12-23`);
    expect(screen.getAllByRole('link', { name: 'Upload bars' })).toHaveLength(2);
  });

  it('is said without them before it is due', async () => {
    await show(closedEntry(), { at: '2026-12-15T22:00:00.000Z' });
    expect(screen.getByText('ZZIX: the close of 23 Dec, not due yet')).toBeTruthy();
    expect(screen.getAllByRole('link', { name: 'Type the bar' })).toHaveLength(1);
  });

  it('names the fill that is missing after the expiry', async () => {
    const entry = closedEntry();
    if (entry.outcome?.profit == null) throw new Error('It has a profit.');
    const { outcome } = entry;
    await show({
      ...entry,
      row: { ...entry.row, state: 'open' },
      outcome: { ...outcome, profit: { ...entry.outcome.profit, isFinal: false } },
    });
    expect(screen.getByText('ZZIX: the fill, expiry or exercise that ended the position')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Go to the fills' }));
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Fills' }));
  });

  it('is not said of what no bar will ever tell', async () => {
    const entry = closedEntry();
    if (entry.outcome === null) throw new Error('It has an outcome.');
    const { odds, ...outcome } = entry.outcome;
    const untold = odds.map((item): (typeof odds)[number] => ({ ...item, waitsFor: null, cannotTell: CANNOT_TELL }));
    await show({ ...entry, outcome: { ...outcome, odds: untold } });
    expect(screen.queryByText(/close of 23 Dec/)).toBeNull();
  });
});

describe('the review of a closed entry', () => {
  it('takes two more taps from its line on Today: the lesson is open to write, and one saves it', async () => {
    const { calls } = await show(closedEntry(), { section: 'lesson' });
    const field = screen.getByRole('textbox', { name: 'Lesson' });
    fireEvent.change(field, { target: { value: 'Wait for the close.' } });
    await act(async () => {
      fireEvent.click(screen.getByRole('button', { name: 'Save lesson' }));
    });
    expect(calls).toContain(`PUT /entries/${ids.entry}/lesson`);
    await screen.findByText('Wait for the close.');
  });
});

describe('printing', () => {
  it('has the browser print the page', async () => {
    await show(closedEntry());
    const print = jest.spyOn(window, 'print').mockImplementation(() => undefined);
    fireEvent.click(screen.getByRole('button', { name: 'Print' }));
    expect(print).toHaveBeenCalledTimes(1);
  });
});
