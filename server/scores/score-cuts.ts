import { meanBrierScore } from '@/journal/scoring/brier-score';
import { clusteredMean } from '@/journal/scoring/clustered-mean';
import { standOut } from '@/journal/scoring/false-discovery';
import { horizonClasses } from '@/journal/scoring/horizon-class';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';
import { grouped } from '@/server/scores/grouped';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { callClusters, effectiveCount, type ScoredCall } from '@/server/scores/score-clusters';
import { type CutKind, type Scores } from '@/shared/scores/scores';

interface Cut {
  readonly kind: CutKind;
  readonly value: string;
  readonly label: string;
  readonly calls: readonly ScoredCall[];
}

/** The record cut by structure, underlying, horizon and tag; looked at together, so that many cuts give few false finds. */
export function scoreCuts(
  calls: readonly ScoredCall[],
  symbolOf: (underlyingId: string) => string,
  options: SampleOptions,
): Scores['cuts'] {
  const cuts = [
    ...cutBy('structure', calls, ({ entry }) => [entry.structureKind]),
    ...cutBy('underlying', calls, ({ entry }) => [entry.underlyingId], symbolOf),
    ...cutBy('horizon', calls, ({ entry }) => [entry.horizonClass]).sort(
      (one, other) => orderOf(one.value) - orderOf(other.value),
    ),
    ...cutBy('tag', calls, ({ entry }) => entry.tags),
  ];
  const reports = cuts.map((cut) => ({ ...cut, report: figuresOf(cut.calls, options) }));
  const tested = reports.filter(({ report }) => report.figures?.pValue != null);
  const flags = standOut(tested.map(({ report }) => report.figures?.pValue ?? 1));
  const standing = new Set(tested.filter((_, index) => flags[index] === true));
  const rowsOf = (kind: CutKind) =>
    reports
      .filter((report) => report.kind === kind)
      .map((one) => {
        const { value, label, report } = one;
        if (report.figures === null) return { value, label, ...report, figures: null };
        const { pValue: _, ...figures } = report.figures;
        return { value, label, ...report, figures: { ...figures, standsOut: standing.has(one) } };
      });
  return {
    structure: rowsOf('structure'),
    underlying: rowsOf('underlying'),
    horizon: rowsOf('horizon'),
    tag: rowsOf('tag'),
  };
}

const orderOf = (value: string) => horizonClasses.findIndex((name) => name === value);

function cutBy(
  kind: CutKind,
  calls: readonly ScoredCall[],
  valuesOf: (call: ScoredCall) => readonly string[],
  labelOf = (value: string) => value,
): Cut[] {
  return [...grouped(calls, valuesOf)]
    .map(([value, members]) => ({ kind, value, label: labelOf(value), calls: members }))
    .sort((one, other) => other.calls.length - one.calls.length || one.label.localeCompare(other.label, 'en'));
}

function figuresOf(calls: readonly ScoredCall[], options: SampleOptions) {
  return sampled(calls.length, options, () => {
    const forecasts = calls.map(({ odds }) => odds.probability);
    const outcomes = calls.map(({ odds }) => odds.happened);
    const misses = calls.map(({ odds }) => Number(odds.happened) - odds.probability);
    const clusters = callClusters(calls);
    const hits = outcomes.filter(Boolean).length;
    return {
      effectiveCount: effectiveCount(misses, clusters),
      stated: forecasts.reduce((sum, one) => sum + one, 0) / forecasts.length,
      observed: hits / calls.length,
      ...wilsonInterval({ hits, count: calls.length }),
      brierScore: meanBrierScore(forecasts, outcomes),
      pValue: clusteredMean(misses, clusters).pValue,
    };
  });
}
