import * as fc from 'fast-check';
import { applyCorrections } from '@/journal/fills/apply-corrections';
import { type ExecutionRow } from '@/journal/fills/execution-row';
import { type Fill } from '@/journal/fills/fill';
import { fillIdentities } from '@/journal/fills/fill-identity';
import { matchLots } from '@/journal/fills/lots';
import { openPositions } from '@/journal/fills/position';
import { option } from '@/tests/journal/fills/fill-fixtures';

const seed = 20261201;
const call = option('call', '102');
const fill = (
  id: string,
  kind: 'buy' | 'sell',
  quantity: string,
  price: string,
  fees: string,
  minute: number,
): Fill => ({
  id,
  kind,
  instrument: call,
  quantity,
  price,
  fees,
  tradedAt: `2027-03-15T14:${String(minute).padStart(2, '0')}:00.000Z`,
  sequence: minute,
});
const trade = (of: Fill): ExecutionRow => ({ kind: 'trade', fill: of });
const correction = (of: Fill, corrects: string): ExecutionRow => ({ kind: 'correction', fill: of, corrects });
const bust = (id: string, busts: string, minute: number): ExecutionRow => ({
  kind: 'bust',
  id,
  busts,
  reportedAt: `2027-03-15T14:${String(minute).padStart(2, '0')}:00.000Z`,
  sequence: minute,
});

// Worked outside this project: effective X1, X3, X6 make 54.68 + 34.02 = 88.70 and leave nothing open.
const x2 = fill('X2', 'sell', '4', '0.62', '2.68', 31);
const rows: ExecutionRow[] = [
  trade(fill('X1', 'buy', '10', '0.45', '6.60', 30)),
  trade(x2),
  trade(x2),
  correction(fill('X3', 'sell', '4', '0.60', '2.68', 40), 'X2'),
  trade(fill('X4', 'sell', '6', '0.55', '4.02', 41)),
  bust('X5', 'X4', 42),
  trade(fill('X6', 'sell', '6', '0.52', '4.02', 43)),
];

describe('a file with a duplicate, a correction and a bust', () => {
  const { effective, rows: judged } = applyCorrections(rows);

  it('leaves X1, X3 and X6, which make 88.70 and are flat', () => {
    expect(effective.map(({ id }) => id)).toEqual(['X1', 'X3', 'X6']);
    const { realisedProfit, closed, open } = matchLots(effective, { method: 'fifo' });
    expect(closed.map((lot) => lot.realisedProfit)).toEqual(['54.68', '34.02']);
    expect([realisedProfit, open]).toEqual(['88.7', []]);
  });

  it('keeps all seven rows, each linked with what acted on it', () => {
    expect(judged.map(({ row }) => row)).toEqual(rows);
    expect(judged.map(({ state, linkedId }) => [state, linkedId])).toEqual([
      ['effective', null],
      ['corrected', 'X3'],
      ['duplicate', 'X2'],
      ['effective', 'X2'],
      ['busted', 'X5'],
      ['bust', 'X4'],
      ['effective', null],
    ]);
  });

  it('puts the correction at the time and place of what it corrects', () => {
    expect(effective[1]).toMatchObject({ tradedAt: x2.tradedAt, sequence: x2.sequence, price: '0.60' });
  });

  it('would show a short of 14 when every trade row counted and the bust did not', () => {
    const counted = rows.flatMap((row, index) => (row.kind === 'bust' ? [] : [{ ...row.fill, id: String(index) }]));
    expect(openPositions(counted)).toMatchObject([{ quantity: '-14' }]);
  });

  it('ties 10,000.00 of opening cash out at 10,088.70, and adds nothing when it is read again', () => {
    // Scenario 5: 7 rows, 1 duplicate, 1 correction, 1 bust, 3 effective.
    const count = (state: string) => judged.filter((row) => row.state === state).length;
    expect([judged.length, count('duplicate'), count('corrected'), count('bust'), effective.length]).toEqual([
      7, 1, 1, 1, 3,
    ]);
    expect(10_000 + Number(matchLots(effective, { method: 'fifo' }).cashFlow)).toBe(10_088.7);
    const again = applyCorrections([...rows, ...rows]);
    expect(again.effective).toEqual(effective);
    expect(again.rows.slice(7).map(({ state }) => state)).toEqual(rows.map(() => 'duplicate'));
  });
});

describe('chains of corrections', () => {
  const [first, second, third] = [
    fill('A', 'buy', '1', '1.00', '0.65', 1),
    fill('B', 'buy', '1', '1.10', '0.65', 2),
    fill('C', 'buy', '1', '1.20', '0.65', 3),
  ];
  const effectiveIds = (some: ExecutionRow[]) => applyCorrections(some).effective.map(({ id }) => id);

  it('leave the last one at the place of the first, whichever of them it refers to', () => {
    for (const corrects of ['A', 'B']) {
      const { effective } = applyCorrections([trade(first), correction(second, 'A'), correction(third, corrects)]);
      expect(effective).toEqual([{ ...third, tradedAt: first.tradedAt, sequence: first.sequence }]);
    }
  });

  it('end with a bust of any of them', () => {
    for (const busted of ['A', 'B']) {
      expect(effectiveIds([trade(first), correction(second, 'A'), bust('X', busted, 9)])).toEqual([]);
    }
  });

  it('may stand in any order of rows', () => {
    const chain = [
      trade(first),
      correction(second, 'A'),
      correction(third, 'B'),
      trade(fill('D', 'buy', '1', '2', '0', 4)),
    ];
    fc.assert(
      fc.property(fc.shuffledSubarray(chain, { minLength: 4 }), (shuffled) => {
        expect(effectiveIds(shuffled)).toEqual(['C', 'D']);
      }),
      { seed, numRuns: 24 },
    );
  });

  it('list what refers to nothing, to itself or to a busted row, and count none of it', () => {
    const states = (some: ExecutionRow[]) => applyCorrections(some).rows.map(({ state }) => state);
    expect(states([correction(second, 'A')])).toEqual(['unresolved']);
    expect(states([correction(second, 'C'), correction(third, 'B')])).toEqual(['unresolved', 'unresolved']);
    const afterBust = [trade(first), bust('X', 'A', 2), correction(third, 'A'), bust('Y', 'A', 4)];
    expect(states(afterBust)).toEqual(['busted', 'bust', 'unresolved', 'unresolved']);
    expect(effectiveIds(afterBust)).toEqual([]);
  });

  it('keep the first of two rows of one id that differ and list the other as a conflict', () => {
    const { effective, rows: judged } = applyCorrections([trade(first), trade({ ...first, price: '9' })]);
    expect(effective).toEqual([first]);
    expect(judged[1]).toMatchObject({ state: 'conflict', linkedId: 'A' });
  });

  it('take 1.0 and 1.00 for the same', () => {
    expect(applyCorrections([trade(first), trade({ ...first, price: '1.0' })]).rows[1]?.state).toBe('duplicate');
  });

  it('refuse a row whose time is no instant', () => {
    expect(() => applyCorrections([trade({ ...first, tradedAt: 'noon' })])).toThrow(
      expect.objectContaining({ code: 'trade-time-invalid' }),
    );
  });

  it('leave nothing of no rows', () => {
    expect(applyCorrections([])).toEqual({ effective: [], rows: [] });
  });
});

describe('fillIdentities', () => {
  const row = (of: Fill, executionId: string | null = null, account = 'main') => ({ account, executionId, fill: of });
  const one = fill('any', 'buy', '1', '1.20', '0.65', 1);

  it('are account and execution id where there is one, whatever else the row says', () => {
    const [plain, repriced, elsewhere] = fillIdentities([
      row(one, 'E1'),
      row({ ...one, price: '9' }, 'E1'),
      row(one, 'E1', 'other'),
    ]);
    expect(repriced).toBe(plain);
    expect(elsewhere).not.toBe(plain);
  });

  it('number equal rows, so that two equal partial fills are two and a second reading adds none', () => {
    const file = [row(one), row(one), row({ ...one, price: '1.21' })];
    const identities = fillIdentities(file);
    expect(new Set(identities).size).toBe(3);
    expect(fillIdentities(file)).toEqual(identities);
    expect(fillIdentities([...file, row(one)]).slice(0, 3)).toEqual(identities);
  });

  it('do not depend on how a number, a strike or an instant is written', () => {
    const rewritten = {
      ...one,
      price: '1.2',
      quantity: '1.0',
      instrument: { ...call, strikePrice: '102.00' },
      tradedAt: '2027-03-15T15:01:00.000+01:00',
    };
    expect(fillIdentities([row(rewritten)])).toEqual(fillIdentities([row(one)]));
  });

  it.each([
    ['side', { kind: 'sell' as const }],
    ['quantity', { quantity: '2' }],
    ['price', { price: '1.21' }],
    ['time', { tradedAt: '2027-03-15T14:01:01.000Z' }],
    ['contract', { instrument: option('put', '102') }],
  ])('tell rows apart that differ in %s', (_what, change) => {
    const [first, second] = fillIdentities([row(one), row({ ...one, ...change })]);
    expect(second).not.toBe(first);
  });

  it('cannot be forged by an account or id with separators in it', () => {
    const identities = fillIdentities([row(one, 'b","c', 'a'), row(one, 'c', 'a","b')]);
    expect(new Set(identities).size).toBe(2);
  });

  it('refuse an empty account or id, a time that is none and a number that is none', () => {
    const refusal = (code: string) => expect.objectContaining({ code });
    expect(() => fillIdentities([row(one, null, '')])).toThrow(refusal('account-missing'));
    expect(() => fillIdentities([row(one, '')])).toThrow(refusal('execution-id-missing'));
    expect(() => fillIdentities([row({ ...one, tradedAt: '' })])).toThrow(refusal('trade-time-invalid'));
    expect(() => fillIdentities([row({ ...one, price: '1,20' })])).toThrow(refusal('decimal-invalid'));
  });
});
