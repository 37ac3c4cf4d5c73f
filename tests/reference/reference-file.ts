/** One case of a reference file; the readers below refuse a field that is missing or of another kind. */
export interface ReferenceCase {
  readonly id: string;
  readonly [field: string]: unknown;
}

export interface ReferenceFile {
  readonly groups: readonly { readonly id: string; readonly cases: readonly ReferenceCase[] }[];
}

export function casesOf({ groups }: ReferenceFile, groupId: string): readonly ReferenceCase[] {
  const group = groups.find(({ id }) => id === groupId);
  if (group === undefined || group.cases.length === 0) throw new Error(`no cases in group ${groupId}`);
  return group.cases;
}

export function numberOf(one: ReferenceCase, field: string): number {
  const value = one[field];
  if (typeof value !== 'number') throw new Error(`${one.id} has no number ${field}`);
  return value;
}

function optionTypeOf(one: ReferenceCase): 'call' | 'put' {
  if (one.type !== 'call' && one.type !== 'put') throw new Error(`${one.id} has no option type`);
  return one.type;
}

/**
 * A case of one clock, in years, put on both: a session of T years, T of them, so that volatility per square root of a year is
 * volatility per square root of a session.
 */
export function oneClockOption(one: ReferenceCase) {
  return {
    type: optionTypeOf(one),
    spotPrice: numberOf(one, 'S'),
    strikePrice: numberOf(one, 'K'),
    sessions: numberOf(one, 'T'),
    years: numberOf(one, 'T'),
    ratePerYear: numberOf(one, 'r'),
    dividendYield: numberOf(one, 'q'),
  };
}

export function expectWithin(actual: number, expected: number, tolerance: number): void {
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(tolerance);
}
