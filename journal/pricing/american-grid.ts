import { type CashDividend } from '@/journal/pricing/escrowed-spot';

/** What a grid is laid over: an American option over its whole life, rates and deviation over the life. */
export interface GridOption {
  readonly type: 'call' | 'put';
  readonly spotPrice: number;
  readonly strikePrice: number;
  readonly interest: number;
  readonly yieldOverLife: number;
  /** Standard deviation of the log price over the life, above 0. */
  readonly deviation: number;
  /** Times as fractions of the life, above 0 up to 1, rising. */
  readonly dividends: readonly CashDividend[];
  /**
   * 'spot': the price itself is lognormal between the dividends and falls by each (to no less than nothing). 'escrowed': the price
   * less the present value of the dividends still to come is lognormal.
   */
  readonly model: 'spot' | 'escrowed';
}

export interface GridValue {
  readonly price: number;
  readonly delta: number;
  readonly gamma: number;
  readonly isExercised: boolean;
}

const STEPS_A_DEVIATION = 60;
const REACH_IN_DEVIATIONS = 7;
const MOST_NODES = 4000;
const TIME_STEPS = 80;
const FEWEST_STEPS_A_PART = 20;
/** Steps after each bend of the value (expiry, dividends) that are taken fully implicitly, in halves. */
const DAMPED_STEPS = 2;
const PENALTY = 1e7;
const MOST_PASSES = 12;

/**
 * Value of an American option by finite differences on the log price: Crank-Nicolson steps with damped first steps, the right to
 * exercise by a penalty, dividends between the steps.
 * @returns within 2e-5 of the larger of price and strike.
 * @see Crank and Nicolson (1947); damping: Rannacher (1984), Numerische Mathematik 43; steps: Reisinger
 *   and Whitley (2014), IMA J. Numerical Analysis 34(3); penalty: Forsyth and Vetzal (2002), SIAM J.
 *   Scientific Computing 23(6), 2095-2122; dividends as jumps: Wilmott, Dewynne and Howison (1993), Option Pricing.
 */
export function gridValue(option: GridOption): GridValue {
  const { spotPrice, strikePrice, dividends, model, interest } = option;
  const isEscrowed = model === 'escrowed';
  const laterDividends = (time: number, includesNow: boolean) =>
    isEscrowed
      ? dividends.reduce(
          (sum, { years, amount }) =>
            years > time || (includesNow && years === time) ? sum + amount * Math.exp(-interest * (years - time)) : sum,
          0,
        )
      : 0;
  const start = spotPrice - laterDividends(0, false);
  const grid = layGrid(option, start);
  const { nodes, prices } = grid;
  const payoff = (price: number) => Math.max(0, option.type === 'call' ? price - strikePrice : strikePrice - price);
  const floor = new Float64Array(nodes);
  const setFloor = (time: number, includesNow: boolean) => {
    const held = laterDividends(time, includesNow);
    for (let node = 0; node < nodes; node += 1) floor[node] = payoff((prices[node] ?? 0) + held);
  };
  const values = Float64Array.from({ length: nodes }, (_, node) => smoothedPayoff(option, grid, node));
  const raise = () => {
    for (let node = 0; node < nodes; node += 1) values[node] = Math.max(values[node] ?? 0, floor[node] ?? 0);
  };
  let upTo = 1;
  for (const dividend of [...dividends].reverse()) {
    if (dividend.years < upTo) {
      setFloor(upTo, false);
      goBack(option, grid, values, { from: upTo, to: dividend.years, floor, setFloor });
      upTo = dividend.years;
    }
    if (!isEscrowed) dropBy(option, grid, values, dividend.amount);
    setFloor(dividend.years, true);
    raise();
  }
  if (upTo > 0) {
    setFloor(upTo, false);
    goBack(option, grid, values, { from: upTo, to: 0, floor, setFloor });
  }
  const { value, slope, bend } = interpolate(grid, values, Math.log(start));
  const exercised = payoff(spotPrice);
  const isExercised = exercised > 0 && value <= exercised * (1 + 1e-9);
  if (isExercised) return { price: exercised, delta: option.type === 'call' ? 1 : -1, gamma: 0, isExercised };
  return {
    price: Math.max(value, exercised),
    delta: slope / start,
    gamma: (bend - slope) / (start * start),
    isExercised,
  };
}

interface Grid {
  readonly nodes: number;
  readonly step: number;
  readonly lowest: number;
  readonly prices: Float64Array;
}

/** Even in the log price, the strike on a node. */
function layGrid(
  { strikePrice, deviation, interest, yieldOverLife, dividends, model }: GridOption,
  start: number,
): Grid {
  const drift = Math.abs(interest - yieldOverLife);
  const reach = REACH_IN_DEVIATIONS * deviation + drift;
  const fall = model === 'spot' ? dividends.reduce((sum, { amount }) => sum + amount, 0) : 0;
  const least = Math.min(start, strikePrice, Math.max(start - fall, 0.2 * start));
  const low = Math.log(least) - reach;
  const high = Math.log(Math.max(start, strikePrice)) + reach;
  // A drift of many deviations keeps the exercise edge nearer to the strike than a deviation.
  const perDeviation = STEPS_A_DEVIATION * (1 + drift / deviation / 2);
  const wanted = Math.ceil(((high - low) / deviation) * perDeviation);
  const nodes = Math.min(MOST_NODES, wanted) + 1;
  const step = (high - low) / (nodes - 1);
  const strike = Math.log(strikePrice);
  const lowest = strike - Math.round((strike - low) / step) * step;
  return {
    nodes,
    step,
    lowest,
    prices: Float64Array.from({ length: nodes }, (_, node) => Math.exp(lowest + node * step)),
  };
}

/** The payoff averaged over a node's cell, so that its bend costs no accuracy. */
function smoothedPayoff({ type, strikePrice }: GridOption, { step, prices }: Grid, node: number): number {
  const price = prices[node] ?? 0;
  const intrinsic = type === 'call' ? price - strikePrice : strikePrice - price;
  if (Math.abs(Math.log(price / strikePrice)) > step / 2) return Math.max(0, intrinsic);
  // The strike's own node: half a cell of a straight line.
  return (strikePrice * (type === 'call' ? Math.expm1(step / 2) - step / 2 : step / 2 + Math.expm1(-step / 2))) / step;
}

interface Part {
  readonly from: number;
  readonly to: number;
  readonly floor: Float64Array;
  readonly setFloor: (time: number, includesNow: boolean) => void;
}

/** Takes the values from a time back to an earlier one; the floor is what exercise brings. */
function goBack(option: GridOption, grid: Grid, values: Float64Array, { from, to, floor, setFloor }: Part): void {
  const span = from - to;
  const steps = Math.max(FEWEST_STEPS_A_PART, Math.ceil(TIME_STEPS * span));
  let time = from;
  // Where it was exercised one step later it mostly is one earlier: a start that saves passes.
  const isFloored = new Uint8Array(grid.nodes);
  for (let step = 0; step < steps; step += 1) {
    // Even in the square root of the time passed: exercise moves by it after a bend, and even steps would leave an error of first order.
    const full = (span * (2 * step + 1)) / (steps * steps);
    const isDamped = step < DAMPED_STEPS;
    for (let half = 0; half < (isDamped ? 2 : 1); half += 1) {
      const length = isDamped ? full / 2 : full;
      time -= length;
      setFloor(Math.max(to, time), false);
      stepBack(option, grid, values, { length, implicit: isDamped ? 1 : 0.5, floor, isFloored });
    }
  }
}

interface Step {
  readonly length: number;
  readonly implicit: number;
  readonly floor: Float64Array;
  /** 1 at the nodes where it is exercised; changed. */
  readonly isFloored: Uint8Array;
}

/** One step back in time, solved anew until the nodes at which it is exercised stay the same. */
function stepBack(
  { interest, yieldOverLife, deviation }: GridOption,
  { nodes, step }: Grid,
  values: Float64Array,
  { length, implicit, floor, isFloored }: Step,
): void {
  const diffusion = (deviation * deviation) / (2 * step * step);
  const convection = (interest - yieldOverLife - (deviation * deviation) / 2) / (2 * step);
  const [below, above] = [diffusion - convection, diffusion + convection];
  const middle = -2 * diffusion - interest;
  const known = new Float64Array(nodes);
  const explicit = (1 - implicit) * length;
  for (let node = 1; node < nodes - 1; node += 1) {
    const value = values[node] ?? 0;
    const change = below * (values[node - 1] ?? 0) + middle * value + above * (values[node + 1] ?? 0);
    known[node] = value + explicit * change;
  }
  // Beyond the grid's ends the value changes little: exercised, or its forward value.
  const decay = Math.exp(-interest * length);
  const growth = Math.exp(-yieldOverLife * length);
  const ends = [0, nodes - 1].map((node) => Math.max(floor[node] ?? 0, (values[node] ?? 0) * Math.min(decay, growth)));
  const share = implicit * length;
  const factor = new Float64Array(nodes);
  const solved = Float64Array.from(values);
  for (let pass = 0; pass < MOST_PASSES; pass += 1) {
    // Thomas's elimination of the three-band system.
    solved[0] = ends[0] ?? 0;
    factor[0] = 0;
    for (let node = 1; node < nodes - 1; node += 1) {
      const penalty = isFloored[node] === 1 ? PENALTY : 0;
      const lower = -share * below;
      const pivot = 1 - share * middle + penalty - lower * (factor[node - 1] ?? 0);
      factor[node] = (-share * above) / pivot;
      const right = (known[node] ?? 0) + penalty * (floor[node] ?? 0) - lower * (solved[node - 1] ?? 0);
      solved[node] = right / pivot;
    }
    solved[nodes - 1] = ends[1] ?? 0;
    for (let node = nodes - 2; node > 0; node -= 1) {
      solved[node] = (solved[node] ?? 0) - (factor[node] ?? 0) * (solved[node + 1] ?? 0);
    }
    let hasChanged = false;
    for (let node = 1; node < nodes - 1; node += 1) {
      const flag = (solved[node] ?? 0) < (floor[node] ?? 0) ? 1 : 0;
      // Once exercised at, the penalty holds a value a trifle below the floor; only a rise above it frees the node.
      if (flag !== isFloored[node]) {
        isFloored[node] = flag;
        hasChanged = true;
      }
    }
    if (!hasChanged) break;
  }
  for (let node = 0; node < nodes; node += 1) values[node] = Math.max(solved[node] ?? 0, floor[node] ?? 0);
}

/** What the option is worth just before a dividend: its value at the price less the dividend. */
function dropBy({ type, strikePrice }: GridOption, grid: Grid, values: Float64Array, amount: number): void {
  const after = Float64Array.from(values);
  const nothing = type === 'call' ? 0 : strikePrice;
  for (let node = 0; node < grid.nodes; node += 1) {
    const left = (grid.prices[node] ?? 0) - amount;
    if (left <= 0) values[node] = nothing;
    else if (left < (grid.prices[0] ?? 0)) values[node] = type === 'call' ? 0 : strikePrice - left;
    else values[node] = interpolate(grid, after, Math.log(left)).value;
  }
}

/** Value and derivatives by the log price, from the cubic through the four nearest nodes. */
function interpolate({ lowest, step, nodes }: Grid, values: Float64Array, logPrice: number) {
  const place = (logPrice - lowest) / step;
  const node = Math.min(nodes - 3, Math.max(1, Math.floor(place)));
  const t = place - node;
  const [a, b, c, d] = [values[node - 1] ?? 0, values[node] ?? 0, values[node + 1] ?? 0, values[node + 2] ?? 0];
  const first = (6 * c - 3 * b - 2 * a - d) / 6;
  const second = (a - 2 * b + c) / 2;
  const third = (3 * b - 3 * c + d - a) / 6;
  return {
    value: b + t * (first + t * (second + t * third)),
    slope: (first + t * (2 * second + 3 * t * third)) / step,
    bend: (2 * second + 6 * t * third) / (step * step),
  };
}
