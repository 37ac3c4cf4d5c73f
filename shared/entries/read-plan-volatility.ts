import { DomainError } from '@/journal/errors/domain-error';
import { type ForecastInput, type ForecastVolatility } from '@/journal/forecast/forecast-input';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { type CloseMethod } from '@/journal/volatility/volatility-method';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { readNumber, type Report } from '@/shared/entries/plan-problem';

/** A close as a plan needs it. */
export interface PlanBar {
  readonly sessionDate: string;
  readonly close: string;
}

const LATER = '9999';

/** The plan's volatility from its closes or as typed, or null after reporting why there is none. */
export function readVolatility(
  draft: DraftPlan,
  spot: ForecastInput['spot'] | null,
  bars: readonly PlanBar[],
  calendar: ExchangeCalendar,
  report: Report,
): ForecastVolatility | null {
  const { source, window } = draft.volatility;
  if (source === 'typed') return readTypedVolatility(draft, report);
  if (spot === null) return null;
  // Only closes that were known at the moment of the spot price: a later upload must not leak into the plan.
  const known = bars.filter((bar) => (calendar.sessionOn(bar.sessionDate)?.closesAt ?? LATER) <= spot.at);
  const method: CloseMethod = source === 'window' ? { kind: 'close', window } : { kind: 'ewma', lambda: 0.94 };
  try {
    const { dailyVolatility, low, high } = estimateCloseVolatility(
      known.map((bar) => Number(bar.close)),
      method,
    );
    return {
      source,
      window: source === 'window' ? window : null,
      lambda: source === 'ewma' ? 0.94 : null,
      low,
      base: dailyVolatility,
      high,
      lastSessionDate: known.at(-1)?.sessionDate ?? null,
    };
  } catch (error) {
    if (!(error instanceof DomainError)) throw error;
    const needed = source === 'window' ? window : 2;
    report(
      'volatility.source',
      `There are ${Math.max(0, known.length - 1)} returns, ${needed} are needed. Choose a shorter window, add bars, or type the volatility.`,
    );
    return null;
  }
}

function readTypedVolatility(draft: DraftPlan, report: Report): ForecastVolatility | null {
  const { lowPercent, basePercent, highPercent, reason } = draft.volatility;
  const rule = (name: string) => ({ name, above: 0, most: 100 });
  const base = readNumber(report, 'volatility.basePercent', basePercent, rule('The base volatility'));
  const low = readNumber(report, 'volatility.lowPercent', lowPercent, rule('The low volatility'));
  const high = readNumber(report, 'volatility.highPercent', highPercent, rule('The high volatility'));
  if (reason.trim() === '') report('volatility.reason', 'A typed volatility needs its reason. Write one sentence.');
  if (base === null || low === null || high === null) return null;
  if (low > base) report('volatility.lowPercent', 'The low volatility must not be above the base.');
  else if (high < base) report('volatility.highPercent', 'The high volatility must not be below the base.');
  else
    return {
      source: 'typed',
      window: null,
      lambda: null,
      low: low / 100,
      base: base / 100,
      high: high / 100,
      lastSessionDate: null,
    };
  return null;
}
