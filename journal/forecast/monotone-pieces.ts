/** Part of a curve on which it only rises or only falls: from one node to another. */
export interface MonotonePiece {
  readonly first: number;
  readonly last: number;
}

export interface PiecedCurve {
  /** Increasing; the turning points are among them. */
  readonly standards: Float64Array;
  readonly profits: Float64Array;
  /** In order, each beginning where the one before ends. */
  readonly pieces: readonly MonotonePiece[];
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;
/** A turning point is flat: beyond half the digits its place says nothing. */
const TURN_TOLERANCE = 1e-9;

/**
 * Cuts a curve at its turning points.
 * @param profitOf continuous; `nodes` increasing, at least 2; changes up to `resolution` are taken for rounding.
 * @see golden section: Kiefer (1953), Proc. AMS 4.
 */
export function monotonePieces(
  profitOf: (standard: number) => number,
  nodes: Float64Array,
  resolution: number,
): PiecedCurve {
  const values = nodes.map(profitOf);
  const turns = turningPoints(profitOf, nodes, values, resolution);
  if (turns.length === 0) {
    return { standards: nodes, profits: values, pieces: [{ first: 0, last: nodes.length - 1 }] };
  }
  const standards = new Float64Array(nodes.length + turns.length);
  const profits = new Float64Array(standards.length);
  const cuts = [0];
  let taken = 0;
  for (const [index, node] of nodes.entries()) {
    for (let turn = turns[taken]; turn !== undefined && turn <= node; turn = turns[taken]) {
      standards[index + taken] = turn;
      profits[index + taken] = profitOf(turn);
      cuts.push(index + taken);
      taken += 1;
    }
    standards[index + taken] = node;
    profits[index + taken] = values[index] ?? 0;
  }
  cuts.push(standards.length - 1);
  const pieces = cuts.slice(1).map((last, index) => ({ first: cuts[index] ?? 0, last }));
  return { standards, profits, pieces: pieces.filter(({ first, last }) => last > first) };
}

/** One turning point wherever the curve goes up and then down, or down and then up. */
function turningPoints(
  profitOf: (standard: number) => number,
  nodes: Float64Array,
  values: Float64Array,
  resolution: number,
): number[] {
  const turns: number[] = [];
  let direction = 0;
  let stepBefore = 0;
  for (let index = 0; index + 1 < nodes.length; index += 1) {
    const change = (values[index + 1] ?? 0) - (values[index] ?? 0);
    if (!(Math.abs(change) > resolution)) continue;
    const next = Math.sign(change);
    if (direction !== 0 && next !== direction) {
      turns.push(goldenSection((x) => direction * profitOf(x), nodes[stepBefore] ?? 0, nodes[index + 1] ?? 0));
    }
    direction = next;
    stepBefore = index;
  }
  return turns;
}

/** Where a function of one hump is greatest. */
function goldenSection(valueAt: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [leftValue, rightValue] = [valueAt(left), valueAt(right)];
  while (high - low > TURN_TOLERANCE) {
    if (leftValue >= rightValue) {
      high = right;
      [right, rightValue] = [left, leftValue];
      left = high - GOLDEN * (high - low);
      leftValue = valueAt(left);
    } else {
      low = left;
      [left, leftValue] = [right, rightValue];
      right = low + GOLDEN * (high - low);
      rightValue = valueAt(right);
    }
  }
  return (low + high) / 2;
}
