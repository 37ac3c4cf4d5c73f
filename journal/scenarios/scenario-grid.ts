import { DomainError } from '@/journal/errors/domain-error';
import { type Scenario, type SpotMove, type VolatilityShift } from '@/journal/scenarios/scenario';
import { priceAfter, profitInState, type ScenarioPosition } from '@/journal/scenarios/scenario-position';

/** What changes along one side of a grid. */
export type ScenarioAxis =
  | { readonly kind: 'move'; readonly moves: readonly SpotMove[] }
  | { readonly kind: 'sessions'; readonly sessionsElapsed: readonly number[] }
  | { readonly kind: 'volatility'; readonly shifts: readonly VolatilityShift[] };

/**
 * Profit over any two of move, sessions elapsed and volatility, every cell repriced in full.
 * @param question.fixed what is the same in every cell; what an axis changes is not read from it.
 * @returns profits by row and column, currency, before closing costs.
 * @throws {DomainError} `scenario-axes-equal`, and as priceAfter and profitInState.
 * @see Taleb (1997), Dynamic Hedging, on repricing instead of Greeks; common practice.
 */
export function scenarioGrid(
  position: ScenarioPosition,
  question: { readonly rows: ScenarioAxis; readonly columns: ScenarioAxis; readonly fixed: Scenario },
): number[][] {
  const { rows, columns, fixed } = question;
  if (rows.kind === columns.kind) throw new DomainError('scenario-axes-equal', { kind: rows.kind });
  if (rows.kind === 'move') return turned(scenarioGrid(position, { rows: columns, columns: rows, fixed }));
  // Rows now are sessions or volatility: one pricing function serves a whole row of moves.
  return stepsOf(rows).map((rowStep) => {
    const inRow = { ...fixed, ...rowStep };
    if (columns.kind === 'move') {
      const profitAt = profitInState(position, inRow);
      return columns.moves.map((move) => profitAt(priceAfter(position, move)));
    }
    const price = priceAfter(position, fixed.move);
    return stepsOf(columns).map((columnStep) => profitInState(position, { ...inRow, ...columnStep })(price));
  });
}

function stepsOf(axis: Exclude<ScenarioAxis, { kind: 'move' }>): Partial<Scenario>[] {
  return axis.kind === 'sessions'
    ? axis.sessionsElapsed.map((sessionsElapsed) => ({ sessionsElapsed }))
    : axis.shifts.map((volatility) => ({ volatility }));
}

function turned(grid: readonly (readonly number[])[]): number[][] {
  return (grid[0] ?? []).map((_, column) => grid.map((row) => row[column] ?? 0));
}
