import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';

/**
 * The value that settles options expiring in the session of a bar, or null while it is not there. Settled from openings, the close
 * says nothing: only the official value does.
 */
export function settlementOf({ underlying }: Pick<ForecastInput, 'underlying'>, bar: OutcomeBar): number | null {
  return bar.settlement ?? (underlying.settlementTime === 'pm' ? bar.close : null);
}
