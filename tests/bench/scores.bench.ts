import { corpDecomposition } from '@/journal/scoring/corp-decomposition';
import { forecastScores } from '@/journal/scoring/scoring-summary';
import { reliabilityBand } from '@/journal/scoring/reliability-band';
import { seededRandom } from '@/journal/random/seeded-random';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { reportSpeed } from '@/tests/bench/report-speed';

const random = seededRandom(20261201);
const forecasts = Array.from({ length: 100_000 }, () => random.uniform());
const outcomes = forecasts.map((forecast) => random.uniform() < forecast);

const again = (figure: () => number) => (count: number) => {
  let sum = 0;
  for (let done = 0; done < count; done += 1) sum += figure();
  return sum;
};

const rows = compareSpeed(
  {
    name: '100,000 forecasts: sorted, nothing else',
    work: again(() => [...forecasts].sort((one, other) => one - other)[0] ?? 0),
  },
  [
    {
      name: 'every score, test, bin and the calibrated curve',
      work: again(() => forecastScores(forecasts, outcomes).meanBrierScore),
    },
    {
      name: 'the terms of the calibrated curve',
      work: again(() => corpDecomposition(forecasts, outcomes).miscalibration),
    },
    {
      name: 'its consistency band, 100 resamples',
      work: again(() => reliabilityBand(forecasts, { seed: 1 }).points[0]?.high ?? 0),
    },
  ],
);
reportSpeed({ title: 'Scores over 100,000 resolved forecasts, sets a second', aim: 0.05, rows });
