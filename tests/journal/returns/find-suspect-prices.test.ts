import { type CheckedPrice, findSuspectPrices } from '@/journal/returns/find-suspect-prices';
import { seededRandom } from '@/journal/random/seeded-random';
import { addDays } from '@/journal/sessions/session-date';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

const dateAt = (at: number) => addDays('2026-01-01', at);

/** Closes of 1 % a session, on days one after the other. */
function quietPrices(count: number): CheckedPrice[] {
  const random = seededRandom(17);
  let close = 100;
  return Array.from({ length: count }, (_, at) => {
    // Never beyond 3 deviations, so that nothing here is suspect by chance.
    close *= Math.exp(0.01 * Math.max(-3, Math.min(3, random.normal())));
    return { sessionDate: dateAt(at), close };
  });
}

const found = (...question: Parameters<typeof findSuspectPrices>) =>
  findSuspectPrices(...question).map(({ sessionDate, what }) => [sessionDate, what]);

describe('far moves', () => {
  it('are none in a quiet series', () => {
    expect(findSuspectPrices(quietPrices(300))).toEqual([]);
  });

  it('are the way to a slip of the keyboard and the way back, however large the slip', () => {
    for (const factor of [1.2, 10, 0.01]) {
      const prices = quietPrices(60).map((price, at) =>
        at === 30 ? { ...price, close: price.close * factor } : price,
      );
      expect(found(prices)).toEqual([
        [dateAt(30), 'far-move'],
        [dateAt(31), 'far-move'],
      ]);
    }
  });

  it('say how far and what to do', () => {
    const prices = quietPrices(60).map((price, at) => (at === 59 ? { ...price, close: 2 * price.close } : price));
    expect(findSuspectPrices(prices)[0]?.why).toMatch(
      /^a move of \d+\.\d % on the session before, \d+\.\d times the usual\. Check the close\.$/,
    );
  });

  it('are found among returns most of which are 0, by the deviation of the others', () => {
    // Every fourth close steps by 1 %, so that the median absolute deviation is 0 and a step is usual; one of 20 % is not.
    const prices = Array.from({ length: 80 }, (_, at) => ({
      sessionDate: dateAt(at),
      close: 100 * 1.01 ** Math.floor(at / 3) * (at >= 50 ? 1.2 : 1),
    }));
    expect(found(prices)).toContainEqual([dateAt(50), 'far-move']);
    expect(found(prices)).toHaveLength(1);
  });

  it('are any move at all where nothing else moves', () => {
    const prices = Array.from({ length: 30 }, (_, at) => ({ sessionDate: dateAt(at), close: at < 15 ? 5 : 5.01 }));
    expect(findSuspectPrices(prices)).toContainEqual({
      sessionDate: dateAt(15),
      what: 'far-move',
      why: 'a move of 0.2 % on the session before, where no other moves. Check the close.',
    });
  });

  it('need twenty returns', () => {
    const jump = (count: number) =>
      quietPrices(count).map((price, at) => (at === 5 ? { ...price, close: 900 } : price));
    expect(found(jump(20))).toEqual([]);
    expect(found(jump(21))).toHaveLength(2);
  });
});

describe('stale prices', () => {
  it('are four equal closes in a row, named once at the last, not three', () => {
    const closes = [1, 2, 2, 2, 3, 4, 4, 4, 4, 4, 5];
    const prices = closes.map((close, at) => ({ sessionDate: dateAt(at), close }));
    expect(findSuspectPrices(prices)).toEqual([
      {
        sessionDate: dateAt(9),
        what: 'repeated-close',
        why: 'the same close for 5 sessions. Check whether it was carried on.',
      },
    ]);
  });

  it('are a bar without range whose volume is not known, or 0', () => {
    const flat = { open: 9, high: 9, low: 9, close: 9 };
    expect(found([{ sessionDate: dateAt(0), ...flat }])).toEqual([[dateAt(0), 'no-range']]);
    expect(found([{ sessionDate: dateAt(0), ...flat, volume: 0 }])).toEqual([[dateAt(0), 'no-range']]);
    expect(found([{ sessionDate: dateAt(0), ...flat, volume: 100 }])).toEqual([]);
    expect(found([{ sessionDate: dateAt(0), close: 9, open: null, high: null, low: null }])).toEqual([]);
  });

  it('end with more than one session closed since, by the calendar', () => {
    // 25 December 2026 is a holiday, the weekend follows.
    const prices = [{ sessionDate: '2026-12-23', close: 10 }];
    const at = (latestSessionDate: string) =>
      findSuspectPrices(prices, { calendar: usOptionsCalendar, latestSessionDate });
    expect(at('2026-12-23')).toEqual([]);
    expect(at('2026-12-24')).toEqual([]);
    expect(at('2026-12-28')).toEqual([
      { sessionDate: '2026-12-23', what: 'stale', why: '2 sessions have closed since. Add their prices.' },
    ]);
  });
});

describe('prices that do not fit', () => {
  const good = { sessionDate: dateAt(0), open: 10, high: 11, low: 9, close: 10 };

  it.each([
    { high: 8 },
    { close: 12 },
    { close: 8 },
    { open: 12 },
    { open: 8 },
    { open: Number.NaN },
    { high: Number.NaN },
  ])('are pointed out with %j', (wrong) => {
    expect(found([{ ...good, ...wrong }])).toEqual([[dateAt(0), 'outside-range']]);
  });

  it('are not suspected where a price is not known', () => {
    expect(found([good, { ...good, sessionDate: dateAt(1), high: null, close: 50 }])).toEqual([]);
  });
});

describe('sessions without a price', () => {
  it('are named by the calendar at the price after them, holidays and weekends left out', () => {
    const prices = ['2026-12-23', '2026-12-24', '2026-12-29', '2027-01-05'].map((sessionDate, at) => ({
      sessionDate,
      close: 10 + at,
    }));
    expect(findSuspectPrices(prices, { calendar: usOptionsCalendar })).toEqual([
      {
        sessionDate: '2026-12-29',
        what: 'missing-sessions',
        why: 'the session of 2026-12-28 has no price before this one. Add what is missing.',
      },
      {
        sessionDate: '2027-01-05',
        what: 'missing-sessions',
        why: '3 sessions from 2026-12-30 on have no price before this one. Add what is missing.',
      },
    ]);
  });
});

describe('a search for suspects', () => {
  it('finds none in nothing', () => {
    expect(findSuspectPrices([], { calendar: usOptionsCalendar, latestSessionDate: '2026-12-24' })).toEqual([]);
  });

  it.each([
    [
      [
        { sessionDate: '2026-01-02', close: 1 },
        { sessionDate: '2026-01-02', close: 1 },
      ],
      'session-dates-not-rising',
    ],
    [[{ sessionDate: '2026-01-02', close: 0 }], 'close-invalid'],
    [[{ sessionDate: '2026-01-02', close: Number.NaN }], 'close-invalid'],
    [[{ sessionDate: '2026-01-02', close: Infinity }], 'close-invalid'],
  ])('refuses %j as %s', (prices, code) => {
    expect(() => findSuspectPrices(prices)).toThrow(expect.objectContaining({ code }));
  });
});
