/** 2^(step/32), the rounding of each below half a unit of its last place. */
const ROOTS_OF_TWO = Float64Array.of(
  1,
  1.0218971486541166,
  1.0442737824274138,
  1.0671404006768237,
  1.0905077326652577,
  1.1143867425958924,
  1.1387886347566916,
  1.1637248587775775,
  1.189207115002721,
  1.215247359980469,
  1.241857812073484,
  1.2690509571917332,
  1.2968395546510096,
  1.3252366431597413,
  1.3542555469368927,
  1.383909881963832,
  1.4142135623730951,
  1.4451808069770467,
  1.4768261459394993,
  1.5091644275934228,
  1.5422108254079407,
  1.5759808451078865,
  1.6104903319492543,
  1.645755478153965,
  1.681792830507429,
  1.718619298122478,
  1.7562521603732995,
  1.7947090750031072,
  1.8340080864093424,
  1.8741676341103,
  1.9152065613971474,
  1.9571441241754002,
);
const ROOTS = 32;
/** Where in the table the power 0 lies: behind the roots come all powers from -1130 on, those below the doubles as 0. */
const POWER_0 = ROOTS + 1130;
const ROOTS_AND_POWERS = rootsAndPowers();

/** Halving and doubling are exact, which a power function need not be. */
function rootsAndPowers(): Float64Array {
  const table = new Float64Array(POWER_0 + 1024);
  for (let power = 0, value = 1; power < 1024; power += 1, value *= 2) table[POWER_0 + power] = value;
  for (let power = 0, value = 1; POWER_0 + power >= ROOTS; power -= 1, value /= 2) table[POWER_0 + power] = value;
  table.set(ROOTS_OF_TWO);
  return table;
}

// Constants stand inside the functions of this folder that pricing spends its time in: a compiler folds them there, and cannot
// where a bundler has made variables of them.

/**
 * exp(exponent + rest) within the range of doubles, in arithmetic that is the same on every machine, which the built-in function
 * need not be, and without a call: a price with its Greeks takes two.
 * @param exponent -780 to 709; `rest` up to 1e-4 in size: digits of the exponent that its own double cannot hold.
 * @returns relative error below 2e-16.
 * @see Tang (1989), ACM TOMS 15, for the reduction by roots of two; table and series are our own.
 */
export function exponentialOfSum(exponent: number, rest: number): number {
  const table = ROOTS_AND_POWERS;
  const steps = Math.floor(exponent * 46.16624130844683 + 0.5) | 0; // of ln 2 / 32
  // The step in two parts; whole numbers of steps times the first are exact. The remainder is up to 0.011 in size.
  const r = exponent - steps * 0.021660849392446835 - steps * 5.145609244655338e-14 + rest;
  const square = r * r;
  const series = r + square * (1 / 2 + r * (1 / 6) + square * (1 / 24 + r * (1 / 120) + square * (1 / 720)));
  const root = table[steps & 31] ?? NaN;
  return (table[(steps >> 5) + 1162] ?? NaN) * (root + root * series);
}

/**
 * The exponential function, the same on every machine.
 * @param exponent any number; NaN gives NaN.
 * @returns relative error about 1e-16; 0 and Infinity where the result leaves the doubles.
 * @see as {@link exponentialOfSum}.
 */
export function exponential(exponent: number): number {
  if (exponent > 709.782712893384) return Infinity;
  if (exponent < -745.1332191019412) return 0;
  if (exponent > 709) return exponentialOfSum(exponent - 1, 0) * Math.E; // up to the last double
  return exponent === exponent ? exponentialOfSum(exponent, 0) : NaN;
}

/**
 * exp(exponent) − 1, with all digits where interest over hours is far below one rounding of 1.
 * @param exponent any number; NaN gives NaN.
 * @returns above -1; relative error about 1e-16 up to 1/64 in size, a rounding of 1 beyond.
 * @see the exponential series.
 */
export function exponentialLessOne(exponent: number): number {
  const x = exponent;
  if (x === 0) return 0; // most stocks pay no yield
  const isSmall = x <= 1 / 64 && x >= -1 / 64;
  if (!isSmall) return exponential(x) - 1;
  return x + x * x * (1 / 2 + x * (1 / 6 + x * (1 / 24 + x * (1 / 120 + x * (1 / 720 + x * (1 / 5040))))));
}
