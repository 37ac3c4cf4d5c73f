import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { type Scores } from '@/shared/scores/scores';
import { addUnderlying, indexFields } from '@/tests/server/support/journal';
import { type ScoredOdds, ScoredRows } from '@/tests/server/support/scored-rows';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(120_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]);
});

const scoresOf = async (person: TestPerson, query = ''): Promise<Scores> =>
  (await person.get(`/scores${query}`).expect(200)).body;
const calls = (probability: number, cases: number, hits: number): ScoredOdds[] =>
  Array.from({ length: cases }, (_, index) => ({ probability, happened: index < hits }));
/** Of 12 odds of 30, 50 and 70 percent, 2, 2 and 3 came true. */
const week = [...calls(0.3, 4, 2), ...calls(0.5, 4, 2), ...calls(0.7, 4, 3)];

async function journalOf(role: 'trader' | 'lead' = 'trader') {
  const trader = await app.person({ role });
  const underlyingId = await addUnderlying(trader);
  return { trader, underlyingId, rows: new ScoredRows(app, trader, underlyingId) };
}

describe('a mentor’s week of 12 resolved odds', () => {
  it('is a list that cannot tell, until its sums are asked for by name', async () => {
    const { trader, rows } = await journalOf();
    for (const [index, odds] of week.entries())
      await rows.add({ move_place: index < 9 ? 0.5 : 0.9, move_deviations: index < 9 ? 0 : 1.28 }, [odds]);
    const few = await scoresOf(trader);
    expect(few.sentence).toContain('12 odds are resolved: cannot tell yet');
    expect(few.resolved).toHaveLength(12);
    for (const report of [few.odds, few.moves, few.coverage])
      expect(report).toEqual({ count: 12, sampleRule: 'list-only', figures: null });
    expect(few.cuts.structure).toEqual([
      { value: 'bull put', label: 'bull put', count: 12, sampleRule: 'list-only', figures: null },
    ]);

    const asked = await scoresOf(trader, '?evenIfFew=yes');
    expect(asked.odds.sampleRule).toBe('list-only');
    expect(asked.sentence).toContain('cannot tell yet');
    const figures = asked.odds.figures;
    expect(figures?.brier.miscalibration).toBeCloseTo(0.0142, 4);
    expect(figures?.brier.discrimination).toBeCloseTo(0.0139, 4);
    expect(figures?.brier.uncertainty).toBeCloseTo(0.2431, 4);
    expect(figures?.brier.score).toBeCloseTo(0.2433, 4);
    expect(figures).toMatchObject({ events: 7, expectedEvents: expect.closeTo(6, 9), z: expect.closeTo(0.61, 2) });
    const [one] = asked.coverage.figures?.bands ?? [];
    expect(one).toMatchObject({ hits: 9, count: 12, low: expect.closeTo(0.468, 3), high: expect.closeTo(0.911, 3) });
  });
});

describe('a desk’s month of 48 trades', () => {
  it('has its coverage, its mean and its interval', async () => {
    const { trader, rows } = await journalOf();
    // 28 inside one deviation, 14 between one and two, 6 beyond; profits of mean 41.20 and deviation 310.
    const step = 310 * Math.sqrt(47 / 48);
    for (let index = 0; index < 48; index += 1) {
      const place = index < 28 ? 0.5 : index < 42 ? 0.9 : 0.99;
      await rows.add({
        move_place: place,
        move_deviations: normalQuantile(place),
        is_traded: 1,
        realised_profit: (41.2 + (index % 2 === 0 ? step : -step)).toFixed(9),
        is_followed: index % 3 === 0 ? 0 : 1,
      });
    }
    const { coverage, money, process } = await scoresOf(trader);
    expect(coverage).toMatchObject({ count: 48, sampleRule: 'provisional' });
    const [one, two] = coverage.figures?.bands ?? [];
    expect(one).toMatchObject({ hits: 28, low: expect.closeTo(0.443, 3), high: expect.closeTo(0.712, 3) });
    expect(two?.count).toBe(48);
    expect((two?.count ?? 0) - (two?.hits ?? 0)).toBe(6);
    const figures = money[0]?.figures;
    expect(money).toHaveLength(1);
    expect(figures).toMatchObject({
      mean: expect.closeTo(41.2, 6),
      standardDeviation: expect.closeTo(310, 6),
      standardError: expect.closeTo(44.74, 2),
      effectiveCount: 48,
    });
    expect(figures?.low).toBeCloseTo(-48.8, 1);
    expect(figures?.high).toBeCloseTo(131.2, 1);
    expect(figures?.points.at(-1)).toMatchObject({
      entries: 48,
      expected: 960,
      deviation: expect.closeTo(60 * Math.sqrt(48), 9),
    });
    expect(process).toMatchObject({ count: 48, followedGood: 16, followedBad: 16, leftGood: 8, leftBad: 8 });
    expect(process.figures?.share).toBeCloseTo(32 / 48, 12);
  });
});

describe('the scores', () => {
  it('compare with the market on the same calls only', async () => {
    const { trader, rows } = await journalOf();
    for (let index = 0; index < 30; index += 1)
      await rows.add({}, [
        { probability: 0.6, happened: index % 2 === 0, marketImplied: index < 24 ? 0.8 : undefined },
      ]);
    const { market } = await scoresOf(trader);
    expect(market.count).toBe(24);
    // Half came true: own (0.16 + 0.36) / 2 against (0.04 + 0.64) / 2.
    expect(market.figures?.brier).toMatchObject({
      own: expect.closeTo(0.26, 12),
      market: expect.closeTo(0.34, 12),
      difference: expect.closeTo(-0.08, 12),
    });
    expect(market.figures?.brier.allowance).toBeGreaterThan(0);
  });

  it('keep late seals apart, and do not wait for odds that no bar will answer', async () => {
    const { trader, rows } = await journalOf();
    await rows.add({}, [{ probability: 0.5, happened: true }]);
    const late = await rows.add({ is_late_seal: 1, move_place: 0.5 }, [{ probability: 0.9, happened: false }]);
    const scores = await scoresOf(trader, '?evenIfFew=yes');
    expect(scores.odds.count).toBe(1);
    expect(scores.moves.count).toBe(0);
    expect(scores.late).toMatchObject({ count: 1, figures: { brierScore: expect.closeTo(0.81, 12) } });
    expect(scores.resolved.find(({ entryId }) => entryId === late)?.isLateSeal).toBe(true);
    await app.dataSource.query(
      'UPDATE scored_odds SET happened = NULL, cannot_tell = 1 WHERE desk_id = ? AND entry_id = ?',
      [trader.deskId, late],
    );
    expect(await scoresOf(trader)).toMatchObject({ pendingCount: 0, cannotTellCount: 1 });
  });

  it('narrow by every filter, and say what there is to choose', async () => {
    const { trader, underlyingId, rows } = await journalOf();
    const other = await addUnderlying(trader, { fields: indexFields });
    const odds = [{ probability: 0.4, happened: true }];
    await rows.add({ tags: '["calm"]', is_traded: 1 }, odds);
    await rows.add({ structure_kind: 'long call', horizon_class: '1-5' }, odds);
    await rows.add({ underlying_id: other, exit_session_date: '2026-03-04', tags: '["calm", "event"]' }, odds);
    const counted = async (query: string) => (await scoresOf(trader, query)).odds.count;
    expect(await counted('')).toBe(3);
    expect(await counted(`?underlyingId=${underlyingId}`)).toBe(2);
    expect(await counted('?structureKind=long%20call')).toBe(1);
    expect(await counted('?horizonClass=6-30')).toBe(2);
    expect(await counted('?tag=calm')).toBe(2);
    expect(await counted('?tag=cal')).toBe(0);
    expect(await counted('?from=2026-03-04')).toBe(1);
    expect(await counted('?to=2026-03-03')).toBe(2);
    expect(await counted('?traded=yes')).toBe(1);
    expect(await counted('?traded=no&tag=calm')).toBe(1);
    const { choices, cuts } = await scoresOf(trader, '?traded=yes');
    expect(choices).toMatchObject({
      structureKinds: ['bull put', 'long call'],
      horizonClasses: ['1-5', '6-30'],
      tags: ['calm', 'event'],
    });
    expect(choices.underlyings.map(({ symbol }) => symbol)).toEqual(['HVYQ', 'ZZIX']);
    expect(cuts.tag.map(({ value, count }) => [value, count])).toEqual([['calm', 1]]);
    await trader.get('/scores?horizonClass=ages').expect(400);
    await trader.get('/scores?from=2026-02-30').expect(400);
  });

  it('are of nobody else: not for a colleague, a lead, or a mentor of another', async () => {
    const { trader, rows } = await journalOf();
    await rows.add({}, [{ probability: 0.4, happened: true }]);
    const linked = await app.person({ role: 'mentor', deskOf: trader });
    await app.dataSource.query(
      'INSERT INTO mentorship (id, desk_id, mentor_id, trader_id, accepted_at) VALUES (UUID(), ?, ?, ?, NOW(6))',
      [trader.deskId, linked.id, trader.id],
    );
    const read = await scoresOf(linked);
    expect(read).toMatchObject({ whose: 'mentored', odds: { count: 1 }, choices: { traders: [{ id: trader.id }] } });
    expect((await scoresOf(linked, `?traderId=${linked.id}`)).odds.count).toBe(0);
    const others = [
      await app.person({ role: 'trader', deskOf: trader }),
      await app.person({ role: 'mentor', deskOf: trader }),
      await app.person({ role: 'lead', deskOf: trader }),
      await app.person({ role: 'trader' }),
    ];
    for (const person of others)
      for (const query of ['', `?traderId=${trader.id}`]) {
        const nothing = await scoresOf(person, query);
        expect(nothing).toMatchObject({ odds: { count: 0 }, resolved: [], entries: [], choices: { traders: [] } });
      }
  });

  it('cut the record and flag only what chance among all cuts does not explain', async () => {
    const { trader, rows } = await journalOf();
    for (let index = 0; index < 60; index += 1)
      await rows.add({ structure_kind: index < 30 ? 'bull put' : 'long call' }, [
        { probability: 0.5 + (index % 2) / 100, happened: index < 30 ? index % 2 === 0 : index % 15 === 0 },
      ]);
    const { cuts } = await scoresOf(trader);
    expect(cuts.structure.map(({ label, count, figures }) => [label, count, figures?.standsOut])).toEqual([
      ['bull put', 30, false],
      ['long call', 30, true],
    ]);
    expect(cuts.structure[0]?.figures).toMatchObject({ stated: expect.closeTo(0.505, 9), observed: 0.5 });
  });

  it('give volatility by method, and profits by currency', async () => {
    const { trader, rows } = await journalOf();
    const euro = await addUnderlying(trader, { fields: { ...indexFields, symbol: 'WUVZ', currency: 'EUR' } });
    const parts = {
      profit_from_move: '30',
      profit_from_time: '-5',
      profit_from_volatility: '-2',
      profit_from_carry: '0',
      profit_from_marks: '1.5',
      profit_from_slippage: '-1.2',
      profit_from_fees: '-1.3',
    };
    for (let index = 0; index < 22; index += 1)
      await rows.add({
        volatility_method: '20 sessions',
        volatility_ratio: 1.25,
        realised_profit: '22',
        is_traded: 1,
        ...parts,
        underlying_id: index < 20 ? rows.underlyingId : euro,
      });
    const { volatility, money } = await scoresOf(trader);
    expect(volatility).toMatchObject([
      { method: '20 sessions', count: 22, figures: { ratio: expect.closeTo(1.25, 12) } },
    ]);
    expect(money.map(({ currency, count, figures }) => [currency, count, figures === null])).toEqual([
      ['USD', 20, false],
      ['EUR', 2, true],
    ]);
    expect(money[0]?.figures?.sources).toMatchObject({
      count: 20,
      move: '600',
      slippage: '-24',
      fees: '-26',
      realised: '440',
    });
  });
});
