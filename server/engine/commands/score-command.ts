import { z } from 'zod';
import { meanLogScore } from '@/journal/scoring/log-score';
import { corpDecomposition } from '@/journal/scoring/corp-decomposition';
import { reliabilityBand } from '@/journal/scoring/reliability-band';
import { forecastScores } from '@/journal/scoring/scoring-summary';
import { engineCommand } from '@/server/engine/commands/engine-command';

const scoreCaseSchema = z.strictObject({
  forecasts: z.array(z.number()),
  outcomes: z.array(z.union([z.literal(0), z.literal(1), z.boolean()])),
  /** With a seed the calibrated curve gets its consistency band, which is drawn. */
  seed: z.int().optional(),
});

/**
 * Scores of probability forecasts: Murphy's terms by distinct forecast, those of ten bins with what lies inside them, those of the
 * calibrated curve (for both scores), the tests of calibration, and the curve itself.
 */
export const scoreCommand = engineCommand(scoreCaseSchema, ({ forecasts, outcomes, seed }) => {
  const { decomposition, binned, curve, ...scores } = forecastScores(forecasts, outcomes);
  const { reliability, resolution, uncertainty } = decomposition;
  return {
    brier: scores.meanBrierScore,
    reliability,
    resolution,
    uncertainty,
    skill: scores.skill,
    logScore: meanLogScore(forecasts, outcomes),
    clippedLogScore: scores.meanLogScore,
    clippedCount: scores.clippedCount,
    baseRate: scores.baseRate,
    binned,
    corp: { brier: corpDecomposition(forecasts, outcomes), log: corpDecomposition(forecasts, outcomes, 'log') },
    count: scores.count,
    spiegelhalter: scores.spiegelhalter,
    calibratedCurve: curve.points,
    calibrationBins: curve.bins,
    ...(seed === undefined ? {} : { consistencyBand: reliabilityBand(forecasts, { seed }).points }),
  };
});
