import { touchOddsAtCloses } from '@/journal/odds/monitored-at-closes';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { studentOddsBeyondLevel } from '@/journal/odds/student-odds';
import { touchFirstOdds } from '@/journal/odds/touch-first-odds';
import { touchOdds } from '@/journal/odds/touch-odds';
import { americanImpliedVolatility } from '@/journal/pricing/american-implied-volatility';
import { americanOptionPrice, americanOptionValue } from '@/journal/pricing/american-option';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { bandCoverage } from '@/journal/scoring/band-coverage';
import { clusterBootstrapInterval, clusteredMean } from '@/journal/scoring/clustered-mean';
import { corpDecomposition } from '@/journal/scoring/corp-decomposition';
import { effectiveSampleSize, intraclassCorrelation } from '@/journal/scoring/effective-sample-size';
import { exactCoverageTest, exactInterval } from '@/journal/scoring/coverage';
import { standOut } from '@/journal/scoring/false-discovery';
import { kupiecTest } from '@/journal/scoring/kupiec-test';
import { normalRankedScore } from '@/journal/scoring/normal-ranked-score';
import { transformUniformity } from '@/journal/scoring/probability-integral-transform';
import { reliabilityBand } from '@/journal/scoring/reliability-band';
import { casesForMargin, casesToTellFrequency, casesToTellMean } from '@/journal/scoring/sample-size-needed';
import { forecastScores } from '@/journal/scoring/scoring-summary';
import { transformHistogram } from '@/journal/scoring/transform-histogram';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';
import { sessionsBetween } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type Draw } from '@/tests/journal/any-input/draw';
import { given, type Prepared } from '@/tests/journal/any-input/prepared-call';

const option = ({ number, oneOf }: Draw) => ({
  type: oneOf(['call', 'put'] as const),
  spotPrice: number(1, 300),
  strikePrice: number(1, 300),
  dailyVolatility: number(0, 0.1),
  sessions: number(0, 40),
  years: number(0, 0.2),
  ratePerYear: number(-0.02, 0.1),
  dividendYield: number(-0.02, 0.1),
});
const levelQuestion = ({ number }: Draw) => ({
  spotPrice: number(1, 300),
  level: number(1, 300),
  totalDeviation: number(0, 0.5),
  logDrift: number(-0.1, 0.1),
});
const hitCount = ({ whole, number }: Draw) => ({ hits: whole(0, 60), count: whole(1, 60), stated: number(0, 1) });
const record = ({ list, number, oneOf }: Draw) => {
  const forecasts = list(12, () => number(0, 1));
  return { forecasts, outcomes: forecasts.map(() => oneOf([true, false])) };
};
const clustered = ({ list, number, whole }: Draw) => {
  const values = list(12, () => number(-5, 5));
  return { values, clusters: values.map(() => whole(0, 3)) };
};

export const callsOfOptionsAndScores: Readonly<Record<string, Prepared>> = {
  europeanOptionPrice: given(option, europeanOptionPrice),
  europeanOptionValue: given(option, europeanOptionValue),
  impliedDailyVolatility: given((draw) => ({ ...option(draw), price: draw.number(0, 60) }), impliedDailyVolatility),
  americanOptionValue: given(option, (one) => americanOptionValue(one), 20),
  'americanOptionPrice with dividends': given(
    (draw) => ({
      ...option(draw),
      dividends: draw.list(3, () => ({ years: draw.number(0, 0.2), amount: draw.number(0, 3) })),
      dividendModel: draw.oneOf(['spot', 'escrowed'] as const),
    }),
    (one) => americanOptionPrice(one),
    200,
  ),
  americanImpliedVolatility: given(
    (draw) => ({ ...option(draw), price: draw.number(0, 60) }),
    americanImpliedVolatility,
    50,
  ),
  oddsBeyondLevel: given(levelQuestion, oddsBeyondLevel),
  touchOddsAtCloses: given((draw) => ({ ...levelQuestion(draw), closes: draw.whole(1, 30) }), touchOddsAtCloses),
  studentOddsBeyondLevel: given(
    (draw) => ({ ...levelQuestion(draw), returns: draw.whole(2, 60) }),
    studentOddsBeyondLevel,
  ),
  touchFirstOdds: given(
    ({ number }) => ({
      spotPrice: number(90, 110),
      lowerLevel: number(50, 90),
      upperLevel: number(110, 150),
      totalDeviation: number(0, 0.5),
      logDrift: number(-0.1, 0.1),
    }),
    touchFirstOdds,
  ),
  touchOdds: given(levelQuestion, touchOdds),
  sessionsBetween: given(
    (draw) => ({ from: draw.instant(), to: draw.instant(), overnightShare: draw.number(0, 1) }),
    ({ from, to, overnightShare }) =>
      sessionsBetween({ calendar: usOptionsCalendar, from, to, settings: { overnightShare } }),
  ),
  wilsonInterval: given(hitCount, wilsonInterval),
  exactInterval: given(hitCount, exactInterval),
  exactCoverageTest: given(hitCount, exactCoverageTest),
  kupiecTest: given(hitCount, kupiecTest),
  forecastScores: given(record, ({ forecasts, outcomes }) => forecastScores(forecasts, outcomes)),
  corpDecomposition: given(record, ({ forecasts, outcomes }) => corpDecomposition(forecasts, outcomes, 'log')),
  reliabilityBand: given(
    (draw) => draw.list(3, () => draw.number(0, 1)),
    (forecasts) => reliabilityBand(forecasts, { seed: 1 }),
    50,
  ),
  normalRankedScore: given(
    ({ number }) => ({ mean: number(-1, 1), standardDeviation: number(0, 1), observed: number(-1, 1) }),
    normalRankedScore,
  ),
  transformUniformity: given((draw) => draw.list(12, () => draw.number(0, 1)), transformUniformity),
  transformHistogram: given(
    (draw) => draw.list(12, () => ({ low: draw.number(0, 0.5), high: draw.number(0.5, 1) })),
    (intervals) => transformHistogram(intervals),
  ),
  bandCoverage: given(
    (draw) => ({ places: draw.list(12, () => draw.number(0, 1)), deviations: [draw.number(0, 4)] }),
    ({ places, deviations }) => bandCoverage(places, deviations),
  ),
  standOut: given(
    (draw) => draw.list(12, () => draw.number(0, 1)),
    (pValues) => standOut(pValues),
  ),
  clusteredMean: given(clustered, ({ values, clusters }) => clusteredMean(values, clusters)),
  clusterBootstrapInterval: given(clustered, ({ values, clusters }) =>
    clusterBootstrapInterval(values, clusters, { seed: 1, resamples: 100 }),
  ),
  intraclassCorrelation: given(clustered, ({ values, clusters }) => intraclassCorrelation(values, clusters)),
  effectiveSampleSize: given(
    (draw) => ({ sizes: draw.list(6, () => draw.whole(1, 9)), correlation: draw.number(0, 1) }),
    ({ sizes, correlation }) => effectiveSampleSize(sizes, correlation),
  ),
  casesForMargin: given(
    ({ number }) => number(0, 0.5),
    (margin) => casesForMargin(margin),
  ),
  casesToTellFrequency: given(
    ({ number }) => ({ stated: number(0, 1), actual: number(0, 1) }),
    (frequencies) => casesToTellFrequency(frequencies),
  ),
  casesToTellMean: given(
    ({ number }) => ({ mean: number(-50, 50), standardDeviation: number(0, 300) }),
    (one) => casesToTellMean(one),
  ),
};
