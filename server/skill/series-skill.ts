import { DomainError } from '@/journal/errors/domain-error';
import { logReturns } from '@/journal/returns/log-returns';
import { leastWalkReturns, type SkillRow, walkForward } from '@/journal/volatility-forecast/walk-forward';
import { type CloseSeries, SeriesFileError } from '@/server/skill/read-series-file';

const problems: ReadonlyMap<string, string> = new Map([
  ['returns-constant', 'the closes do not move for a whole stretch that a forecast rests on. Leave the column out.'],
  ['return-invalid', 'a close is more than e^100 times its neighbour. Correct it.'],
]);

/**
 * Skill of all methods over one series of a file.
 * @throws {SeriesFileError} for a series too short, or one that no method can forecast.
 */
export function seriesSkill({ series, closes }: CloseSeries, fileName: string): SkillRow[] {
  const required = leastWalkReturns + 1;
  if (closes.length < required)
    throw new SeriesFileError(
      `${fileName}, column ${series}: ${closes.length} closes, and ${required} are needed. Give a longer series.`,
    );
  try {
    return walkForward(logReturns(closes));
  } catch (error) {
    if (!(error instanceof DomainError)) throw error;
    const problem = problems.get(error.code) ?? `${error.message}. Check its closes.`;
    throw new SeriesFileError(`${fileName}, column ${series}: ${problem}`);
  }
}
