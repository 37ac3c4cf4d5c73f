/** A point and the value of the function there. */
interface Vertex {
  readonly point: readonly number[];
  readonly value: number;
}

/**
 * Least value of a function near a start, without derivatives; the same steps on every machine.
 * @param question.valueOf finite or Infinity everywhere; `start` at least 1 coordinate; `steps` one for each, the size of the first
 *   simplex; `tolerance` difference of values at which to stop, above 0; `mostSteps` whole number from 1.
 * @returns the best point found and its value.
 * @see Nelder and Mead (1965), Computer Journal 7, 308-313, coefficients 1, 2, 1/2, 1/2.
 */
export function nelderMead(question: {
  readonly valueOf: (point: readonly number[]) => number;
  readonly start: readonly number[];
  readonly steps: readonly number[];
  readonly tolerance: number;
  readonly mostSteps: number;
}): Vertex {
  const { valueOf, start, steps, tolerance, mostSteps } = question;
  const at = (point: readonly number[]): Vertex => ({ point, value: valueOf(point) });
  const first = at(start);
  let rest = start.map((_, moved) =>
    at(start.map((value, axis) => (axis === moved ? value + (steps[axis] ?? 0) : value))),
  );
  let best = first;
  for (let step = 0; step < mostSteps; step += 1) {
    const ordered = [best, ...rest].sort((left, right) => left.value - right.value);
    [best = first] = ordered;
    const worst = ordered.at(-1) ?? best;
    const kept = ordered.slice(0, -1);
    if (worst.value - best.value <= tolerance) break;
    const centre = start.map((_, axis) => kept.reduce((sum, { point }) => sum + (point[axis] ?? 0), 0) / kept.length);
    const along = (stretch: number) =>
      at(centre.map((value, axis) => value + stretch * ((worst.point[axis] ?? 0) - value)));
    const replacement = replaceWorst(along, { best, nextWorst: kept.at(-1) ?? best, worst });
    rest =
      replacement === null
        ? ordered.slice(1).map(({ point }) => at(halfway(point, best.point)))
        : [...kept.slice(1), replacement];
  }
  return [best, ...rest].reduce((least, vertex) => (vertex.value < least.value ? vertex : least));
}

/** The point that takes the place of the worst, or null if the simplex has to shrink. */
function replaceWorst(
  along: (stretch: number) => Vertex,
  { best, nextWorst, worst }: { best: Vertex; nextWorst: Vertex; worst: Vertex },
): Vertex | null {
  const reflected = along(-1);
  if (reflected.value < best.value) {
    const expanded = along(-2);
    return expanded.value < reflected.value ? expanded : reflected;
  }
  if (reflected.value < nextWorst.value) return reflected;
  const isOutside = reflected.value < worst.value;
  const contracted = along(isOutside ? -0.5 : 0.5);
  return contracted.value < Math.min(reflected.value, worst.value) ? contracted : null;
}

function halfway(point: readonly number[], towards: readonly number[]): number[] {
  return point.map((value, axis) => (value + (towards[axis] ?? 0)) / 2);
}
