import { z } from 'zod';
import { calibrationCurve } from '@/journal/scoring/calibration-curve';
import { meanLogScore } from '@/journal/scoring/log-score';
import { murphyDecomposition } from '@/journal/scoring/murphy-decomposition';
import { engineCommand } from '@/server/engine/commands/engine-command';

const scoreCaseSchema = z.strictObject({
  forecasts: z.array(z.number()),
  outcomes: z.array(z.union([z.literal(0), z.literal(1), z.boolean()])),
});

/** Scores of probability forecasts with Murphy's terms by distinct forecast, and the calibrated curve. */
export const scoreCommand = engineCommand(scoreCaseSchema, ({ forecasts, outcomes }) => {
  const { brierScore, reliability, resolution, uncertainty } = murphyDecomposition(forecasts, outcomes);
  return {
    brier: brierScore,
    reliability,
    resolution,
    uncertainty,
    logScore: meanLogScore(forecasts, outcomes),
    calibratedCurve: calibrationCurve(forecasts, outcomes).points,
  };
});
