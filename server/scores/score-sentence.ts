import { type CalibrationBin } from '@/journal/scoring/calibration-curve';

/** From so many cases a level of odds may be spoken of. */
const FEWEST_IN_BIN = 10;

const percent = (fraction: number) => `${Math.round(fraction * 100)}%`;

/**
 * What calibration says in one plain sentence: the level of odds whose frequency is farthest off, by what chance allows.
 * @param bins of the calibration curve. @param count all scored odds. @param whose of the reader's own odds, or of those they mentor.
 * @param isSpoken false while the sample rule allows a list only.
 */
export function scoreSentence(
  bins: readonly CalibrationBin[],
  { count, whose, isSpoken }: { count: number; whose: 'own' | 'mentored'; isSpoken: boolean },
): string {
  if (!isSpoken) {
    const head =
      count === 0 ? 'No odds are resolved' : count === 1 ? '1 odds is resolved' : `${count} odds are resolved`;
    return `${head}: cannot tell yet. Rates are shown from 20 on; until then, look at each one below.`;
  }
  const spoken = bins.filter((bin) => bin.count >= FEWEST_IN_BIN);
  const farthest = [...spoken].sort((left, right) => distance(right) - distance(left))[0];
  if (farthest === undefined) return `${count} odds are scored; no level of odds has enough cases to speak of yet.`;
  const { forecast, observed, low, high } = farthest;
  const head = `${whose === 'own' ? 'Your' : 'Their'} ${percent(forecast)} calls came in ${percent(observed)} of the time over ${farthest.count} cases`;
  const points = Math.round(Math.abs(forecast - observed) * 100);
  if (forecast >= low && forecast <= high)
    return `${head}: within what chance allows (${percent(low)} to ${percent(high)}).`;
  const isTooSure = Math.abs(observed - 0.5) < Math.abs(forecast - 0.5);
  return `${head}: ${isTooSure ? 'too sure' : 'not sure enough'} by about ${points} points; chance alone would allow ${percent(low)} to ${percent(high)}.`;
}

function distance({ forecast, observed, low, high }: CalibrationBin): number {
  return Math.abs(forecast - observed) / Math.max(1e-9, (high - low) / 2);
}
