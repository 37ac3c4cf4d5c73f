import { histogram } from '@/journal/returns/histogram';
import { normalFit } from '@/journal/returns/normal-fit';
import { quantilePairs } from '@/journal/returns/quantile-pairs';
import { varianceRatio } from '@/journal/returns/variance-ratio';
import { bootstrapVolatilityInterval } from '@/journal/volatility/bootstrap-volatility-interval';
import { estimateVolatility } from '@/journal/volatility/estimate-volatility';
import { fatTailVolatilityInterval } from '@/journal/volatility/fat-tail-volatility-interval';
import { overnightShare } from '@/journal/volatility/overnight-share';
import { volatilityByHorizon } from '@/journal/volatility/volatility-by-horizon';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import { type Draw } from '@/tests/journal/any-input/draw';
import { given, type Prepared } from '@/tests/journal/any-input/prepared-call';

const returns = ({ list, number }: Draw) => list(40, () => number(-0.05, 0.05));
const closes = ({ list, number }: Draw) => list(40, () => number(50, 60));
const bars = ({ list, number, oneOf }: Draw) =>
  list(30, () => {
    const [open, close] = [number(50, 60), number(50, 60)];
    const reach = oneOf([0, 1, number(0, 3)]);
    return { open, close, high: Math.max(open, close) + reach, low: Math.min(open, close) - reach };
  });
const rangeMethods = ['parkinson', 'garmanKlass', 'rogersSatchell', 'garmanKlassYangZhang', 'yangZhang'] as const;

export const callsOfVolatility: Readonly<Record<string, Prepared>> = {
  'estimateVolatility of closes': given(
    (draw) => ({
      closes: closes(draw),
      window: draw.whole(2, 30),
      mean: draw.oneOf(['sample', 'zero'] as const),
      confidence: draw.number(0.5, 0.99),
    }),
    ({ closes: series, window, mean, confidence }) =>
      estimateVolatility({ closes: series }, { kind: 'close', window, mean }, confidence),
  ),
  'estimateVolatility by weights': given(
    (draw) => ({ closes: closes(draw), lambda: draw.number(0.8, 1) }),
    ({ closes: series, lambda }) => estimateVolatility({ closes: series }, { kind: 'ewma', lambda }),
  ),
  'estimateVolatility of bars': given(
    (draw) => ({ bars: bars(draw), kind: draw.oneOf(rangeMethods), window: draw.whole(2, 20) }),
    ({ bars: series, kind, window }) => estimateVolatility({ bars: series }, { kind, window }),
  ),
  volatilityInterval: given(
    ({ number, whole }) => ({
      dailyVolatility: number(0, 0.1),
      degreesOfFreedom: whole(1, 300),
      confidence: number(0.5, 0.999),
    }),
    volatilityInterval,
  ),
  fatTailVolatilityInterval: given(
    ({ number, whole }) => ({
      dailyVolatility: number(0, 0.1),
      count: whole(1, 300),
      kurtosis: number(1, 20),
      confidence: number(0.5, 0.999),
    }),
    fatTailVolatilityInterval,
  ),
  bootstrapVolatilityInterval: given(
    returns,
    (series) => bootstrapVolatilityInterval(series, { mean: 'sample', seed: 1, resamples: 100 }),
    10,
  ),
  normalFit: given(returns, (series) => normalFit(series)),
  histogram: given(returns, (series) => histogram(series)),
  quantilePairs: given(returns, (series) => quantilePairs(series)),
  varianceRatio: given(
    (draw) => ({ returns: returns(draw), sessions: draw.whole(2, 12) }),
    ({ returns: series, sessions }) => varianceRatio(series, { sessions }),
  ),
  volatilityByHorizon: given(
    (draw) => ({ closes: closes(draw), window: draw.whole(2, 30), horizons: draw.list(3, () => draw.whole(1, 10)) }),
    ({ closes: series, window, horizons }) => volatilityByHorizon(series, { window, horizons }),
  ),
  overnightShare: given(bars, (series) => overnightShare(series, { seed: 1, resamples: 100 }), 10),
};
