/** One leg of a named structure, relative to the others. */
export interface PatternLeg {
  readonly side: 'buy' | 'sell';
  readonly type: 'call' | 'put' | 'shares';
  /** Rank of its strike among those of the structure, 0 the lowest; 0 for shares. */
  readonly strike: number;
  /** Rank of its expiry, 0 the nearest; 0 for shares. */
  readonly expiry: number;
  /** Contracts a unit; `few` and `many` are the structure's own, few below many. */
  readonly ratio: number | 'few' | 'many';
}

/** What one unit of a structure cost and where its strikes are, per share. */
export interface StructureTerms {
  /** Lowest first. */
  readonly strikes: readonly number[];
  /** Net amount paid for options and shares, negative when received. */
  readonly cost: number;
  /** Contracts of the smaller and the larger leg of a ratio; 1 and 2 where the structure has none. */
  readonly few: number;
  readonly many: number;
}

/** Ends and break-evens at expiry per share of one unit; null means without limit. */
export interface StructureEnds {
  readonly gain: number | null;
  /** Positive where money is lost. */
  readonly loss: number | null;
  /** Lowest first. */
  readonly breakEvens: readonly number[];
}

export interface StructureRow {
  readonly name: string;
  readonly legs: readonly PatternLeg[];
  /** Other legs that go by the same name; it is never built with them. */
  readonly otherLegs: readonly PatternLeg[] | null;
  /** Whether the outer gaps between strikes are of one width. */
  readonly isEven: boolean;
  /** How its strikes are said: all ascending, all descending, or the outermost two. */
  readonly saying: 'ascending' | 'descending' | 'outer';
  /** The trade's formulas for the usual range of the cost; null where the later leg needs a model. */
  readonly ends: ((terms: StructureTerms) => StructureEnds) | null;
}

export function buy(
  type: PatternLeg['type'],
  strike = 0,
  { ratio = 1, expiry = 0 }: Partial<Pick<PatternLeg, 'ratio' | 'expiry'>> = {},
): PatternLeg {
  return { side: 'buy', type, strike, expiry, ratio };
}

export function sell(
  type: PatternLeg['type'],
  strike = 0,
  { ratio = 1, expiry = 0 }: Partial<Pick<PatternLeg, 'ratio' | 'expiry'>> = {},
): PatternLeg {
  return { side: 'sell', type, strike, expiry, ratio };
}

/** The same legs from the other side. */
export function reversed(legs: readonly PatternLeg[]): PatternLeg[] {
  return legs.map((leg) => ({ ...leg, side: leg.side === 'buy' ? 'sell' : 'buy' }));
}
