import fc from 'fast-check';
import { buildStructure, type StructureRequest } from '@/journal/contracts/build-structure';
import { expiryPayoff } from '@/journal/contracts/expiry-payoff';
import { recogniseStructure, requireStructure, structureRow } from '@/journal/contracts/recognise-structure';
import { structureEnds } from '@/journal/contracts/structure-ends';
import { isStockLeg, type StructureLeg } from '@/journal/contracts/structure-leg';
import { structureName } from '@/journal/contracts/structure-name';
import { type StructureName, structureTable } from '@/journal/contracts/structure-table';

const names = structureTable.map(({ name }) => name);
const oneExpiry = structureTable.filter(({ ends }) => ends !== null).map(({ name }) => name);
const strikesIn = (name: StructureName) =>
  new Set(structureRow(name).legs.flatMap((leg) => (leg.type === 'shares' ? [] : [leg.strike]))).size;
const expiriesIn = (name: StructureName) =>
  new Set(structureRow(name).legs.flatMap((leg) => (leg.type === 'shares' ? [] : [leg.expiry]))).size;

const dates = ['2026-12-18', '2026-12-23'];
const request = (name: StructureName, given: Partial<StructureRequest> = {}): StructureRequest => {
  let count = 0;
  return {
    places: { kind: 'widths', lowestStrikePrice: '95', widths: strikesIn(name) > 1 ? ['5'] : [] },
    expirySessionDates: dates.slice(0, Math.max(1, expiriesIn(name))),
    quantity: 1,
    nextId: () => `leg-${(count += 1)}`,
    ...given,
  };
};

const widths = fc.record({
  lowest: fc.integer({ min: 40, max: 90 }),
  wing: fc.integer({ min: 1, max: 9 }),
  body: fc.integer({ min: 1, max: 9 }),
});
const widthsOf = (count: number, wing: number, body: number) =>
  count === 4 ? [wing, body, wing] : Array.from({ length: Math.max(0, count - 1) }, () => wing);

describe('every named structure', () => {
  it.each(names)('is recognised when built: %s', (name) => {
    fc.assert(
      fc.property(
        widths,
        fc.integer({ min: 1, max: 30 }),
        fc.integer({ min: 1, max: 3 }),
        ({ lowest, wing, body }, quantity, few) => {
          const built = buildStructure(
            name,
            request(name, {
              quantity,
              ratio: { few, many: few + 1 },
              places: {
                kind: 'widths',
                lowestStrikePrice: String(lowest),
                widths: widthsOf(strikesIn(name), wing, body).map(String),
              },
            }),
          );
          const found = recogniseStructure([...built].reverse());
          expect(found?.name).toBe(name);
          expect(found?.units).toBe(quantity);
          expect(requireStructure(name, built).units).toBe(quantity);
        },
      ),
      { seed: 20261209, numRuns: 20 },
    );
  });

  it.each(oneExpiry)('has the ends and break-evens of its formula in the exact pay-off: %s', (name) => {
    fc.assert(
      fc.property(
        widths,
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.boolean(),
        fc.integer({ min: 1, max: 3 }),
        ({ lowest, wing, body }, share, isDebit, few) => {
          const strikes = [lowest];
          for (const width of widthsOf(strikesIn(name), wing, body)) {
            strikes.push((strikes[strikes.length - 1] ?? 0) + width);
          }
          const used = strikes.slice(0, strikesIn(name));
          const ratio = { few, many: few + 1 };
          const legs = payoffLegs(name, used, ratio);
          // The usual range of a cost: between the least and the greatest value that the legs can come to.
          const free = expiryPayoff({ ...legs, cost: 0 });
          const least = free.greatestLoss ?? (free.greatestGain ?? 0) - wing;
          const most = free.greatestGain ?? (free.greatestLoss ?? 0) + wing;
          const cost = isRatio(name)
            ? (isDebit ? 1 : -1) * share * wing * 0.4 * few
            : least + (most - least) * Math.min(share, 0.6) * (name.includes('reversal') ? 0.1 : 1);
          const payoff = expiryPayoff({ ...legs, cost });
          const ends = structureEnds(name, { strikes: used, cost, ...ratio });
          expectClose(payoff.greatestGain, ends?.gain ?? null);
          expectClose(payoff.greatestLoss === null ? null : -payoff.greatestLoss, ends?.loss ?? null);
          const wanted = [...(ends?.breakEvens ?? [])].filter((price) => price > 0).sort((one, two) => one - two);
          expect(payoff.breakEvens).toHaveLength(wanted.length);
          for (const [index, price] of wanted.entries()) expectClose(payoff.breakEvens[index] ?? null, price);
        },
      ),
      { seed: 20261209, numRuns: 40 },
    );
  });

  it('has a name of its own and legs of its own', () => {
    expect(new Set(names).size).toBe(names.length);
    expect(new Set(structureTable.map(({ legs }) => JSON.stringify(legs))).size).toBe(names.length);
  });
});

function isRatio(name: StructureName): boolean {
  return structureRow(name).legs.some(({ ratio }) => ratio === 'few');
}

function payoffLegs(name: StructureName, strikes: readonly number[], ratio: { few: number; many: number }) {
  const contracts = (leg: { readonly side: string; readonly ratio: number | 'few' | 'many' }) =>
    (leg.side === 'buy' ? 1 : -1) * (typeof leg.ratio === 'number' ? leg.ratio : ratio[leg.ratio]);
  const { legs } = structureRow(name);
  return {
    legs: legs.flatMap((leg) =>
      leg.type === 'shares'
        ? []
        : [{ type: leg.type, strikePrice: strikes[leg.strike] ?? 0, signedShares: contracts(leg) }],
    ),
    shares: legs.reduce((sum, leg) => (leg.type === 'shares' ? sum + contracts(leg) : sum), 0),
  };
}

function expectClose(actual: number | null, wanted: number | null): void {
  if (actual === null || wanted === null) expect(actual).toBe(wanted);
  else expect(actual).toBeCloseTo(wanted, 9);
}

describe('structureName', () => {
  it.each<[string, StructureName, Partial<StructureRequest>]>([
    ['covered call 95', 'covered call', {}],
    ['2 × collar 95 / 100', 'collar', { quantity: 2 }],
    ['long 300 shares', 'long shares', { quantity: 3 }],
    ['long call calendar 95', 'long call calendar', {}],
    ['long put diagonal 100 / 95', 'long put diagonal', {}],
    ['long box 95 / 100', 'long box', {}],
    ['put ratio spread 95 / 100, 3 × 2', 'put ratio spread', { ratio: { few: 2, many: 3 } }],
    ['long call condor 95 / 100 / 105 / 110', 'long call condor', {}],
    ['bearish risk reversal 95 / 100', 'bearish risk reversal', {}],
  ])('says “%s”', (text, name, given) => {
    expect(structureName(buildStructure(name, request(name, given)))).toBe(text);
  });

  it('counts shares by what a contract delivers', () => {
    const built = buildStructure('covered call', request('covered call', { sharesPerContract: 10 }));
    expect(built.find(isStockLeg)?.quantity).toBe(10);
    expect(structureName(built, 10)).toBe('covered call 95');
    expect(structureName(built)).toBe('2 legs');
  });

  it('takes legs of one series and side together', () => {
    const [leg] = buildStructure('long call', request('long call'));
    if (leg === undefined) throw new Error('a long call has a leg');
    expect(structureName([leg, { ...leg, id: 'again' }])).toBe('long 2 × 95 call');
  });
});

describe('buildStructure', () => {
  it('puts strikes at distances in deviations on the nearest strike', () => {
    const built = buildStructure(
      'iron condor',
      request('iron condor', {
        places: {
          kind: 'sigmas',
          spotPrice: 100,
          totalDeviation: 0.0474,
          distances: [-2, -1, 1, 2],
          strikeStep: '0.5',
        },
      }),
    );
    expect(built.map((leg) => (isStockLeg(leg) ? '' : leg.strikePrice))).toEqual(['91', '95.5', '105', '110']);
  });

  it.each<[string, StructureName, Partial<StructureRequest>, string]>([
    ['too few strikes', 'bull call', { places: { kind: 'strikes', strikePrices: ['95'] } }, 'structure-strike-count'],
    [
      'strikes out of order',
      'bull call',
      { places: { kind: 'strikes', strikePrices: ['95', '95.0'] } },
      'structure-strikes-order',
    ],
    [
      'uneven wings',
      'long call butterfly',
      { places: { kind: 'strikes', strikePrices: ['95', '100', '106'] } },
      'structure-wings-uneven',
    ],
    [
      'one expiry for a calendar',
      'long call calendar',
      { expirySessionDates: ['2026-12-18'] },
      'structure-expiry-count',
    ],
    ['two expiries for a call', 'long call', { expirySessionDates: dates }, 'structure-expiry-count'],
    [
      'expiries out of order',
      'long call calendar',
      { expirySessionDates: ['2026-12-23', '2026-12-18'] },
      'structure-expiries-order',
    ],
    ['a quantity of 0', 'long call', { quantity: 0 }, 'structure-quantity-invalid'],
    ['half a unit', 'long call', { quantity: 0.5 }, 'structure-quantity-invalid'],
    ['a ratio of 2 to 2', 'call ratio spread', { ratio: { few: 2, many: 2 } }, 'structure-ratio-invalid'],
    [
      'a distance without deviation',
      'long call',
      { places: { kind: 'sigmas', spotPrice: 100, totalDeviation: 0, distances: [1], strikeStep: '1' } },
      'structure-distance-invalid',
    ],
    [
      'a strike that is no number',
      'long call',
      { places: { kind: 'strikes', strikePrices: ['x'] } },
      'decimal-invalid',
    ],
  ])('refuses %s', (_, name, given, code) => {
    expect(() => buildStructure(name, request(name, given))).toThrow(code);
  });
});

describe('requireStructure', () => {
  const withQuantity = (legs: readonly StructureLeg[], index: number, quantity: number) =>
    legs.map((leg, at) => (at === index ? { ...leg, quantity } : leg));

  it.each<[StructureName, number, number]>([
    ['bull put', 1, 2],
    ['long call butterfly', 1, 3],
    ['iron condor', 3, 2],
    ['covered call', 1, 2],
    ['call ratio spread', 1, 1],
  ])('says which leg of a %s has the wrong quantity', (name, legIndex, quantity) => {
    const legs = withQuantity(buildStructure(name, request(name)), legIndex, quantity);
    expect(() => requireStructure(name, legs)).toThrow(
      expect.objectContaining({
        code: 'structure-leg-quantity',
        details: expect.objectContaining({ legIndex, quantity }),
      }),
    );
  });

  it('refuses the legs of another structure', () => {
    const legs = buildStructure('bull call', request('bull call'));
    expect(() => requireStructure('bear call', legs)).toThrow('structure-legs-mismatch');
    expect(() => requireStructure('iron condor', legs)).toThrow('structure-legs-mismatch');
  });

  it('refuses wings of two widths', () => {
    const legs = buildStructure(
      'long call condor',
      request('long call condor', { places: { kind: 'widths', lowestStrikePrice: '95', widths: ['5'] } }),
    ).map((leg, index) => (index === 3 && !isStockLeg(leg) ? { ...leg, strikePrice: '111' } : leg));
    expect(() => requireStructure('long call condor', legs)).toThrow('structure-wings-uneven');
  });
});
