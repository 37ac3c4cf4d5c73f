const MOST_STEPS = 120;

/**
 * A root of a function between two points where its values have opposite signs.
 * @param valueAt continuous for a root, any function for the place of a sign change.
 * @param bracket `low` < `high` with their values, of opposite signs or 0; `tolerance` of the root, above 0.
 * @returns the end of the last bracket whose value is nearer to 0.
 * @see Chandrupatla (1997), Advances in Engineering Software 28(3): inverse quadratic steps where they are safe, else bisection.
 */
export function bracketedRoot(
  valueAt: (x: number) => number,
  bracket: {
    readonly low: number;
    readonly high: number;
    readonly lowValue: number;
    readonly highValue: number;
    readonly tolerance: number;
  },
): number {
  let [near, far] = [bracket.high, bracket.low];
  let [nearValue, farValue] = [bracket.highValue, bracket.lowValue];
  let share = 0.5;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const x = near + share * (far - near);
    const value = valueAt(x);
    let [older, olderValue] = [near, nearValue];
    if (value > 0 === nearValue > 0) {
      [near, nearValue] = [x, value];
    } else {
      [older, olderValue] = [far, farValue];
      [far, farValue] = [near, nearValue];
      [near, nearValue] = [x, value];
    }
    if (value === 0) return x;
    const best = Math.abs(nearValue) < Math.abs(farValue) ? near : far;
    const margin = bracket.tolerance / Math.abs(far - near);
    if (!(margin < 0.5)) return best;
    share = Math.min(1 - margin, Math.max(margin, nextShare({ near, far, older, nearValue, farValue, olderValue })));
  }
  return near;
}

function nextShare(points: {
  readonly near: number;
  readonly far: number;
  readonly older: number;
  readonly nearValue: number;
  readonly farValue: number;
  readonly olderValue: number;
}): number {
  const { near, far, older, nearValue, farValue, olderValue } = points;
  const place = (near - far) / (older - far);
  const height = (nearValue - farValue) / (olderValue - farValue);
  const isSafe = height * height < place && (1 - height) * (1 - height) < 1 - place;
  if (!isSafe) return 0.5;
  const share =
    (nearValue / (farValue - nearValue)) * (olderValue / (farValue - olderValue)) +
    ((older - near) / (far - near)) * (nearValue / (olderValue - nearValue)) * (farValue / (olderValue - farValue));
  return Number.isFinite(share) ? share : 0.5;
}
