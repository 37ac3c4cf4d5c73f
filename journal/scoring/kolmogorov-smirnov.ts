import { DomainError } from '@/journal/errors/domain-error';

/** From this many values on the limiting distribution is used: it is then good to about a tenth of the p value. */
const exactBelow = 100;

export interface KolmogorovSmirnov {
  /** Greatest distance between the values' distribution function and the uniform one, 0 to 1. */
  readonly distance: number;
  readonly pValue: number;
  readonly isExact: boolean;
}

/**
 * Tests whether values come from the uniform distribution on 0 to 1.
 * @param values each 0 to 1, at least one; taken as independent and without ties.
 * @param form 'exact' or 'asymptotic'; by default exact below 100 values.
 * @throws {DomainError} `values-missing`, `probability-invalid` with the index.
 * @see Exact: Marsaglia, Tsang and Wang (2003), J. Statistical Software 8(18). Asymptotic: Kolmogorov's limit, both series from memory.
 */
export function kolmogorovSmirnovTest(
  values: readonly number[],
  form: 'exact' | 'asymptotic' = values.length < exactBelow ? 'exact' : 'asymptotic',
): KolmogorovSmirnov {
  const distance = uniformDistance(values);
  const pValue =
    form === 'exact'
      ? 1 - exactCumulative({ distance, count: values.length })
      : limitUpperTail(Math.sqrt(values.length) * distance);
  return { distance, pValue: Math.min(1, Math.max(0, pValue)), isExact: form === 'exact' };
}

function uniformDistance(values: readonly number[]): number {
  if (values.length === 0) throw new DomainError('values-missing');
  for (const [index, value] of values.entries()) {
    if (!(value >= 0 && value <= 1)) throw new DomainError('probability-invalid', { index, probability: value });
  }
  const sorted = [...values].sort((one, other) => one - other);
  return sorted.reduce(
    (greatest, value, index) => Math.max(greatest, (index + 1) / sorted.length - value, value - index / sorted.length),
    0,
  );
}

/** P(distance of n uniform values < distance): a power of a matrix built from the fractional part of n x distance. */
function exactCumulative({ distance, count }: { distance: number; count: number }): number {
  const half = Math.floor(count * distance) + 1;
  const size = 2 * half - 1;
  const overshoot = half - count * distance;
  const power = matrixPower(stepMatrix({ size, overshoot }), count);
  let { exponent } = power;
  let result = power.matrix[half - 1]?.[half - 1] ?? 0;
  // n! / n^n, one factor at a time, with the binary exponent kept apart against underflow.
  for (let index = 1; index <= count; index += 1) {
    result *= index / count;
    if (result < 2 ** -500) {
      result *= 2 ** 500;
      exponent -= 500;
    }
  }
  return result * 2 ** exponent;
}

function stepMatrix({ size, overshoot }: { size: number; overshoot: number }): number[][] {
  const inverseFactorials = [1];
  for (let index = 1; index <= size; index += 1) inverseFactorials.push((inverseFactorials[index - 1] ?? 0) / index);
  const corner = 1 - 2 * overshoot ** size + (2 * overshoot > 1 ? (2 * overshoot - 1) ** size : 0);
  return Array.from({ length: size }, (_row, row) =>
    Array.from({ length: size }, (_column, column) => {
      const step = row - column + 1;
      if (step < 0) return 0;
      const isFirst = column === 0;
      const isLast = row === size - 1;
      let numerator = 1;
      if (isFirst && isLast) numerator = corner;
      else if (isFirst) numerator = 1 - overshoot ** (row + 1);
      else if (isLast) numerator = 1 - overshoot ** (size - column);
      return numerator * (inverseFactorials[step] ?? 0);
    }),
  );
}

interface ScaledMatrix {
  readonly matrix: number[][];
  /** The true matrix is this one times 2 to the exponent. */
  readonly exponent: number;
}

function matrixPower(matrix: number[][], power: number): ScaledMatrix {
  if (power === 1) return { matrix, exponent: 0 };
  const root = matrixPower(matrix, Math.floor(power / 2));
  let product = matrixProduct(root.matrix, root.matrix);
  if (power % 2 === 1) product = matrixProduct(matrix, product);
  const largest = product.reduce((most, row) => row.reduce((rowMost, entry) => Math.max(rowMost, entry), most), 0);
  const shift = largest > 2 ** 400 ? 400 : 0;
  const scale = 2 ** -shift;
  return { matrix: product.map((row) => row.map((entry) => entry * scale)), exponent: 2 * root.exponent + shift };
}

function matrixProduct(left: readonly number[][], right: readonly number[][]): number[][] {
  return left.map((row) => {
    const sums = new Array<number>(row.length).fill(0);
    for (const [index, factor] of row.entries()) {
      for (const [column, entry] of (right[index] ?? []).entries()) sums[column] = (sums[column] ?? 0) + factor * entry;
    }
    return sums;
  });
}

/** 1 minus the limiting distribution function; each series where it converges fast. */
function limitUpperTail(scaledDistance: number): number {
  if (scaledDistance <= 0) return 1;
  if (scaledDistance < 1) {
    const decay = -(Math.PI ** 2) / (8 * scaledDistance ** 2);
    let sum = 0;
    for (let odd = 1; odd <= 9; odd += 2) sum += Math.exp(decay * odd ** 2);
    return 1 - (Math.sqrt(2 * Math.PI) / scaledDistance) * sum;
  }
  let sum = 0;
  for (let index = 1; index <= 6; index += 1) {
    sum += (index % 2 === 1 ? 2 : -2) * Math.exp(-2 * (index * scaledDistance) ** 2);
  }
  return sum;
}
