import { type Forecast } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { toModelNumber } from '@/journal/money/decimal';

/** Levels of a plan in total deviations of its hold. */
export interface StripMarks {
  readonly strikes: readonly number[];
  readonly breakEvens: readonly number[];
  readonly target: number | null;
  readonly stop: number | null;
}

/** Where strikes, break-evens, target and stop lie on the landing strip: ln(level/spot) over the hold's total deviation. */
export function stripMarks(input: ForecastInput, forecast: Forecast): StripMarks {
  const spotPrice = toModelNumber(input.spot.price);
  const sigma = (level: number) => Math.log(level / spotPrice) / forecast.totalDeviation.holding.base;
  const sigmaOfText = (text: string | null) => (text === null ? null : sigma(toModelNumber(text)));
  return {
    strikes: input.legs.map((leg) => sigma(toModelNumber(leg.strikePrice))),
    breakEvens: forecast.ends.breakEvens.map(sigma),
    target: sigmaOfText(input.targetPrice),
    stop: sigmaOfText(input.stopPrice),
  };
}
