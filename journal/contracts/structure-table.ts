import {
  buy,
  type PatternLeg,
  reversed,
  sell,
  type StructureEnds,
  type StructureRow,
  type StructureTerms,
} from '@/journal/contracts/structure-pattern';

type Formula = (
  strikes: readonly [number, number, number, number],
  cost: number,
  terms: StructureTerms,
) => StructureEnds;

/** A row whose formula gets up to four strikes by position; those that a structure lacks are never read by it. */
function row<Name extends string>(
  name: Name,
  legs: readonly PatternLeg[],
  formula: Formula | null,
  {
    isEven = false,
    saying = 'ascending',
    otherLegs = null,
  }: Partial<Omit<StructureRow, 'name' | 'legs' | 'ends'>> = {},
): StructureRow & { readonly name: Name } {
  const ends =
    formula === null
      ? null
      : (terms: StructureTerms) => {
          const [first = NaN, second = NaN, third = NaN, fourth = NaN] = terms.strikes;
          return formula([first, second, third, fourth], terms.cost, terms);
        };
  return { name, legs, otherLegs, isEven, saying, ends };
}

const butterfly = (type: 'call' | 'put') => [buy(type, 0), sell(type, 1, { ratio: 2 }), buy(type, 2)];
const condor = (type: 'call' | 'put') => [buy(type, 0), sell(type, 1), sell(type, 2), buy(type, 3)];
const ironCondor = [buy('put', 0), sell('put', 1), sell('call', 2), buy('call', 3)];
const ironButterfly = [buy('put', 0), sell('put', 1), sell('call', 1), buy('call', 2)];
const calendar = (type: 'call' | 'put') => [sell(type, 0), buy(type, 0, { expiry: 1 })];
const box = [buy('call', 0), sell('call', 1), sell('put', 0), buy('put', 1)];

const longWings: Formula = ([low, middle, high], cost) => ({
  gain: middle - low - cost,
  loss: cost,
  breakEvens: [low + cost, high - cost],
});
const shortWings: Formula = ([low, middle, high], cost) => ({
  gain: -cost,
  loss: middle - low + cost,
  breakEvens: [low - cost, high + cost],
});
const longCondor: Formula = ([first, second, , fourth], cost) => ({
  gain: second - first - cost,
  loss: cost,
  breakEvens: [first + cost, fourth - cost],
});
const shortCondor: Formula = ([first, second, , fourth], cost) => ({
  gain: -cost,
  loss: second - first + cost,
  breakEvens: [first - cost, fourth + cost],
});

/**
 * Structures by the trade's names, with legs and the formulas of their ends at expiry. Costs are per share of one unit, shares
 * included; formulas hold for the usual range of the cost (a debit below the width of a debit spread, and so on).
 * @see Hull, Options, Futures, and Other Derivatives; Natenberg, Option Volatility and Pricing; common practice.
 */
export const structureTable = [
  row('long call', [buy('call')], ([k], cost) => ({ gain: null, loss: cost, breakEvens: [k + cost] })),
  row('long put', [buy('put')], ([k], cost) => ({ gain: k - cost, loss: cost, breakEvens: [k - cost] })),
  row('short call', [sell('call')], ([k], cost) => ({ gain: -cost, loss: null, breakEvens: [k - cost] })),
  row('short put', [sell('put')], ([k], cost) => ({ gain: -cost, loss: k + cost, breakEvens: [k + cost] })),
  row('long shares', [buy('shares')], (_, cost) => ({ gain: null, loss: cost, breakEvens: [cost] })),
  row('short shares', [sell('shares')], (_, cost) => ({ gain: -cost, loss: null, breakEvens: [-cost] })),

  row('covered call', [buy('shares'), sell('call')], ([k], cost) => ({
    gain: k - cost,
    loss: cost,
    breakEvens: [cost],
  })),
  row('covered put', [sell('shares'), sell('put')], ([k], cost) => ({
    gain: -cost - k,
    loss: null,
    breakEvens: [-cost],
  })),
  row('protective put', [buy('shares'), buy('put')], ([k], cost) => ({
    gain: null,
    loss: cost - k,
    breakEvens: [cost],
  })),
  row('protective call', [sell('shares'), buy('call')], ([k], cost) => ({
    gain: -cost,
    loss: k + cost,
    breakEvens: [-cost],
  })),
  row('collar', [buy('shares'), buy('put', 0), sell('call', 1)], ([low, high], cost) => ({
    gain: high - cost,
    loss: cost - low,
    breakEvens: [cost],
  })),
  row('conversion', [buy('shares'), buy('put'), sell('call')], ([k], cost) => ({
    gain: k - cost,
    loss: cost - k,
    breakEvens: [],
  })),
  row('reversal', [sell('shares'), sell('put'), buy('call')], ([k], cost) => ({
    gain: -cost - k,
    loss: k + cost,
    breakEvens: [],
  })),

  row('bull call', [buy('call', 0), sell('call', 1)], ([low, high], cost) => ({
    gain: high - low - cost,
    loss: cost,
    breakEvens: [low + cost],
  })),
  row('bear call', [sell('call', 0), buy('call', 1)], ([low, high], cost) => ({
    gain: -cost,
    loss: high - low + cost,
    breakEvens: [low - cost],
  })),
  row(
    'bull put',
    [buy('put', 0), sell('put', 1)],
    ([low, high], cost) => ({ gain: -cost, loss: high - low + cost, breakEvens: [high + cost] }),
    { saying: 'descending' },
  ),
  row(
    'bear put',
    [sell('put', 0), buy('put', 1)],
    ([low, high], cost) => ({ gain: high - low - cost, loss: cost, breakEvens: [high - cost] }),
    { saying: 'descending' },
  ),
  row('long box', box, ([low, high], cost) => ({ gain: high - low - cost, loss: cost - high + low, breakEvens: [] })),
  row('short box', reversed(box), ([low, high], cost) => ({
    gain: low - high - cost,
    loss: high - low + cost,
    breakEvens: [],
  })),

  row('long straddle', [buy('put'), buy('call')], ([k], cost) => ({
    gain: null,
    loss: cost,
    breakEvens: [k - cost, k + cost],
  })),
  row('short straddle', [sell('put'), sell('call')], ([k], cost) => ({
    gain: -cost,
    loss: null,
    breakEvens: [k + cost, k - cost],
  })),
  row('long strangle', [buy('put', 0), buy('call', 1)], ([low, high], cost) => ({
    gain: null,
    loss: cost,
    breakEvens: [low - cost, high + cost],
  })),
  row('short strangle', [sell('put', 0), sell('call', 1)], ([low, high], cost) => ({
    gain: -cost,
    loss: null,
    breakEvens: [low + cost, high - cost],
  })),
  row('long guts', [buy('call', 0), buy('put', 1)], ([low, high], cost) => ({
    gain: null,
    loss: cost - high + low,
    breakEvens: [high - cost, low + cost],
  })),
  row('short guts', [sell('call', 0), sell('put', 1)], ([low, high], cost) => ({
    gain: low - high - cost,
    loss: null,
    breakEvens: [high + cost, low - cost],
  })),
  row('long strip', [buy('put', 0, { ratio: 2 }), buy('call', 0)], ([k], cost) => ({
    gain: null,
    loss: cost,
    breakEvens: [k - cost / 2, k + cost],
  })),
  row('long strap', [buy('put', 0), buy('call', 0, { ratio: 2 })], ([k], cost) => ({
    gain: null,
    loss: cost,
    breakEvens: [k - cost, k + cost / 2],
  })),
  row('synthetic long', [sell('put'), buy('call')], ([k], cost) => ({
    gain: null,
    loss: k + cost,
    breakEvens: [k + cost],
  })),
  row('synthetic short', [buy('put'), sell('call')], ([k], cost) => ({
    gain: k - cost,
    loss: null,
    breakEvens: [k - cost],
  })),
  row('risk reversal', [sell('put', 0), buy('call', 1)], ([low, high], cost) => ({
    gain: null,
    loss: low + cost,
    breakEvens: [cost > 0 ? high + cost : low + cost],
  })),
  row('bearish risk reversal', [buy('put', 0), sell('call', 1)], ([low, high], cost) => ({
    gain: low - cost,
    loss: null,
    breakEvens: [cost > 0 ? low - cost : high - cost],
  })),

  row(
    'call ratio spread',
    [buy('call', 0, { ratio: 'few' }), sell('call', 1, { ratio: 'many' })],
    ([low, high], cost, { few, many }) => {
      const gain = few * (high - low) - cost;
      return {
        gain,
        loss: null,
        breakEvens: [...(cost > 0 ? [low + cost / few] : []), high + gain / (many - few)],
      };
    },
  ),
  row(
    'put ratio spread',
    [sell('put', 0, { ratio: 'many' }), buy('put', 1, { ratio: 'few' })],
    ([low, high], cost, { few, many }) => {
      const gain = few * (high - low) - cost;
      return {
        gain,
        loss: Math.max(cost, (many - few) * low - gain),
        breakEvens: [low - gain / (many - few), ...(cost > 0 ? [high - cost / few] : [])],
      };
    },
  ),
  row(
    'call backspread',
    [sell('call', 0, { ratio: 'few' }), buy('call', 1, { ratio: 'many' })],
    ([low, high], cost, { few, many }) => {
      const loss = few * (high - low) + cost;
      return {
        gain: null,
        loss,
        breakEvens: [...(cost < 0 ? [low - cost / few] : []), high + loss / (many - few)],
      };
    },
  ),
  row(
    'put backspread',
    [buy('put', 0, { ratio: 'many' }), sell('put', 1, { ratio: 'few' })],
    ([low, high], cost, { few, many }) => {
      const loss = few * (high - low) + cost;
      return {
        gain: Math.max(-cost, (many - few) * low - loss),
        loss,
        breakEvens: [low - loss / (many - few), ...(cost < 0 ? [high + cost / few] : [])],
      };
    },
  ),

  row('long call butterfly', butterfly('call'), longWings, { isEven: true }),
  row('short call butterfly', reversed(butterfly('call')), shortWings, { isEven: true }),
  row('long put butterfly', butterfly('put'), longWings, { isEven: true }),
  row('short put butterfly', reversed(butterfly('put')), shortWings, { isEven: true }),
  row('long call condor', condor('call'), longCondor, { isEven: true }),
  row('short call condor', reversed(condor('call')), shortCondor, { isEven: true }),
  row('long put condor', condor('put'), longCondor, { isEven: true }),
  row('short put condor', reversed(condor('put')), shortCondor, { isEven: true }),
  row(
    'iron condor',
    ironCondor,
    ([first, second, third, fourth], cost) => ({
      gain: -cost,
      loss: Math.max(second - first, fourth - third) + cost,
      breakEvens: [second + cost, third - cost],
    }),
    { saying: 'outer' },
  ),
  row(
    'long iron condor',
    reversed(ironCondor),
    ([first, second, third, fourth], cost) => ({
      gain: Math.max(second - first, fourth - third) - cost,
      loss: cost,
      breakEvens: [second - cost, third + cost],
    }),
    { saying: 'outer' },
  ),
  row('iron butterfly', ironButterfly, ([low, middle, high], cost) => ({
    gain: -cost,
    loss: Math.max(middle - low, high - middle) + cost,
    breakEvens: [middle + cost, middle - cost],
  })),
  row('long iron butterfly', reversed(ironButterfly), ([low, middle, high], cost) => ({
    gain: Math.max(middle - low, high - middle) - cost,
    loss: cost,
    breakEvens: [middle - cost, middle + cost],
  })),

  row('long call calendar', calendar('call'), null),
  row('short call calendar', reversed(calendar('call')), null),
  row('long put calendar', calendar('put'), null),
  row('short put calendar', reversed(calendar('put')), null),
  // Usually the later leg is the one nearer to the money; with the strikes crossed the name is the same.
  row('long call diagonal', [buy('call', 0, { expiry: 1 }), sell('call', 1)], null, {
    otherLegs: [sell('call', 0), buy('call', 1, { expiry: 1 })],
  }),
  row('short call diagonal', [sell('call', 0, { expiry: 1 }), buy('call', 1)], null, {
    otherLegs: [buy('call', 0), sell('call', 1, { expiry: 1 })],
  }),
  row('long put diagonal', [sell('put', 0), buy('put', 1, { expiry: 1 })], null, {
    saying: 'descending',
    otherLegs: [buy('put', 0, { expiry: 1 }), sell('put', 1)],
  }),
  row('short put diagonal', [buy('put', 0), sell('put', 1, { expiry: 1 })], null, {
    saying: 'descending',
    otherLegs: [sell('put', 0, { expiry: 1 }), buy('put', 1)],
  }),
] as const;

export type StructureName = (typeof structureTable)[number]['name'];
