export interface Quadrature {
  /** On -1 to 1, rising. */
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const ROOT_STEPS = 100;

/**
 * Nodes and weights that integrate every polynomial of degree below 2 x count exactly over -1 to 1.
 * @param count whole number from 1; a constant of the caller's, not an input.
 * @see Gauss-Legendre quadrature by Newton's method on the Legendre polynomial: Abramowitz and Stegun (1964), 25.4.29 and 22.7.10.
 */
function gaussLegendre(count: number): Quadrature {
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let index = 0; index < count; index += 1) {
    let x = -Math.cos((Math.PI * (index + 0.75)) / (count + 0.5));
    let slope = 1;
    for (let step = 0; step < ROOT_STEPS; step += 1) {
      let [before, value] = [0, 1];
      for (let degree = 0; degree < count; degree += 1) {
        [before, value] = [value, ((2 * degree + 1) * x * value - degree * before) / (degree + 1)];
      }
      slope = (count * (x * value - before)) / (x * x - 1);
      const moved = x - value / slope;
      if (moved === x || Math.abs(moved - x) < 1e-16) break;
      x = moved;
    }
    nodes[index] = x;
    weights[index] = 2 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}

const made = new Map<number, Quadrature>();

/** The quadrature of so many points, made once. */
export function quadratureOf(count: number): Quadrature {
  const known = made.get(count);
  if (known !== undefined) return known;
  const quadrature = gaussLegendre(count);
  made.set(count, quadrature);
  return quadrature;
}
