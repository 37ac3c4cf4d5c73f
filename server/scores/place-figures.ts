import { chiSquareCumulative } from '@/journal/distributions/chi-square-distribution';
import { bandCoverage } from '@/journal/scoring/band-coverage';
import { binomialProbabilities, eventCountQuantile } from '@/journal/scoring/event-count-distribution';
import { kolmogorovSmirnovTest } from '@/journal/scoring/kolmogorov-smirnov';
import { transformHistogram, type TransformInterval } from '@/journal/scoring/transform-histogram';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { type EntryColumns } from '@/server/scores/score-columns';
import { type Scores } from '@/shared/scores/scores';

const CLASSES = 8;

const movePlaces = (entries: readonly EntryColumns[]) => entries.flatMap(({ movePlace }) => movePlace ?? []);

/** Where moves fell in their forecasts. */
export function moveFigures(entries: readonly EntryColumns[], options: SampleOptions): Scores['moves'] {
  const places = movePlaces(entries);
  return sampled(places.length, options, () => ({
    ...histogram(places.map((place) => ({ low: place, high: place }))),
    test: { kind: 'kolmogorov-smirnov' as const, pValue: kolmogorovSmirnovTest(places).pValue },
  }));
}

/** Where profits fell in theirs; one on a lump is spread over the lump. */
export function profitPlaceFigures(entries: readonly EntryColumns[], options: SampleOptions): Scores['profits'] {
  const places = entries.flatMap(({ profitPlaceLow: low, profitPlaceHigh: high }) =>
    low === null || high === null ? [] : [{ low, high }],
  );
  return sampled(places.length, options, () => {
    const figures = histogram(places);
    const distance = figures.counts.reduce((sum, count) => sum + (count - figures.due) ** 2 / figures.due, 0);
    // Spread lumps lie closer to even than counts do, so this finds rather too little.
    const pValue = Math.min(1, Math.max(0, 1 - chiSquareCumulative(distance, CLASSES - 1)));
    return { ...figures, test: { kind: 'chi-square' as const, pValue } };
  });
}

/** How often moves stayed inside their bands of 1, 2 and 3 deviations. */
export function coverageFigures(entries: readonly EntryColumns[], options: SampleOptions): Scores['coverage'] {
  const places = movePlaces(entries);
  return sampled(places.length, options, () => ({
    bands: bandCoverage(places).map(({ deviations, stated, hits, count, observed, low, high, kupiec, clustering }) => ({
      deviations,
      stated,
      hits,
      count,
      observed,
      low,
      high,
      pValue: kupiec.pValue,
      clusteringPValue: clustering?.pValue ?? null,
    })),
  }));
}

function histogram(places: readonly TransformInterval[]) {
  const chance = binomialProbabilities({ count: places.length, probability: 1 / CLASSES });
  return {
    counts: transformHistogram(places, CLASSES),
    due: places.length / CLASSES,
    low: eventCountQuantile(chance, 0.05),
    high: eventCountQuantile(chance, 0.95),
  };
}
