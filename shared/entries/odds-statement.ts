import { type StatedOdds } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';

/** The sentence a probability belongs to: "97 put in the money", "Target 102.40 touched". */
export function oddsStatement({ event }: Pick<StatedOdds, 'event'>, { legs }: Pick<ForecastInput, 'legs'>): string {
  switch (event.kind) {
    case 'in-the-money': {
      const leg = legs.find(({ id }) => id === event.legId);
      return leg === undefined ? 'In the money' : `${leg.strikePrice} ${leg.type} in the money`;
    }
    case 'profit-at-expiry':
      return 'Profit at expiry';
    case 'profit-at-exit':
      return 'Profit at planned exit';
    case 'touch-target':
      return `Target ${event.level} touched`;
    case 'touch-stop':
      return `Stop ${event.level} touched`;
  }
}
