import { type NamedScenario } from '@/journal/scenarios/scenario';
import { priceAfter, profitInState, type ScenarioPosition } from '@/journal/scenarios/scenario-position';

export interface ScenarioResult {
  readonly name: string;
  readonly price: number;
  /** Currency, before closing costs. */
  readonly profit: number;
}

/**
 * Profit of a position in each scenario of a set.
 * @throws {DomainError} as priceAfter and profitInState.
 */
export function runScenarios(position: ScenarioPosition, scenarios: readonly NamedScenario[]): ScenarioResult[] {
  return scenarios.map((scenario) => {
    const price = priceAfter(position, scenario.move);
    return { name: scenario.name, price, profit: profitInState(position, scenario)(price) };
  });
}
