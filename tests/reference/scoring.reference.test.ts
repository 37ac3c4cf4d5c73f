import reference from '@/tests/reference/data/scoring.json';
import { realisedMove } from '@/journal/outcome/realised-move';
import { binnedDecomposition } from '@/journal/scoring/binned-decomposition';
import { brierSkill, meanBrierScore } from '@/journal/scoring/brier-score';
import { exactCoverageTest, exactInterval } from '@/journal/scoring/coverage';
import { kolmogorovSmirnovTest } from '@/journal/scoring/kolmogorov-smirnov';
import { kupiecAcceptedHits, kupiecTest } from '@/journal/scoring/kupiec-test';
import { meanLogScore } from '@/journal/scoring/log-score';
import { murphyDecomposition, murphyFromGroups } from '@/journal/scoring/murphy-decomposition';
import { normalRankedScore } from '@/journal/scoring/normal-ranked-score';
import { type Outcome } from '@/journal/scoring/outcome';
import { transformUniformity } from '@/journal/scoring/probability-integral-transform';
import { tenBinOf } from '@/journal/scoring/ten-bins';

interface Case {
  readonly id: string;
  readonly [field: string]: unknown;
}

function casesOf(groupId: string): Case[] {
  const group = reference.groups.find(({ id }) => id === groupId);
  if (group === undefined) throw new Error(`no group ${groupId}`);
  return group.cases;
}

function numberOf(one: Case, field: string): number {
  const value = one[field];
  if (value === 'Infinity') return Infinity;
  if (typeof value !== 'number') throw new Error(`${one.id} has no number ${field}`);
  return value;
}

function numbersOf(one: Case, field: string): number[] {
  const value = one[field];
  if (!Array.isArray(value)) throw new Error(`${one.id} has no list ${field}`);
  return value.map(Number);
}

/** A nested record of the file, such as the terms of one way of binning. */
function partOf(one: Case, field: string): Case {
  const value = one[field];
  if (typeof value !== 'object' || value === null) throw new Error(`${one.id} has no part ${field}`);
  return { id: `${one.id} ${field}`, ...value };
}

const outcomesOf = (one: Case): Outcome[] => numbersOf(one, 'outcome').map((outcome) => outcome === 1);

function expectWithin(actual: number, expected: number, tolerance: number): void {
  if (expected === Infinity) expect(actual).toBe(Infinity);
  else expect(Math.abs(actual - expected)).toBeLessThanOrEqual(tolerance);
}

/** Of the reference file; no case needed a wider one. */
const scoreTolerance = 1e-12;
const pValueTolerance = 1e-6;
const coverageTolerance = 1e-9;

describe('scores against published and independently computed values', () => {
  it.each(casesOf('scikit-learn-docs'))('has the Brier score of $id', (one) => {
    expectWithin(meanBrierScore(numbersOf(one, 'forecast'), outcomesOf(one)), numberOf(one, 'brier'), scoreTolerance);
  });

  it.each(casesOf('murphy'))('decomposes $id by distinct forecasts', (one) => {
    const forecasts = numbersOf(one, 'forecast');
    const { brierScore, reliability, resolution, uncertainty, groups } = murphyDecomposition(
      forecasts,
      outcomesOf(one),
    );
    expectWithin(brierScore, numberOf(one, 'brier'), scoreTolerance);
    expectWithin(reliability, numberOf(one, 'reliability'), scoreTolerance);
    expectWithin(resolution, numberOf(one, 'resolution'), scoreTolerance);
    expectWithin(uncertainty, numberOf(one, 'uncertainty'), scoreTolerance);
    const skill = brierSkill({ score: brierScore, referenceScore: uncertainty });
    expectWithin(skill ?? NaN, numberOf(one, 'skill'), scoreTolerance);
    expectWithin(meanLogScore(forecasts, outcomesOf(one)), numberOf(one, 'log_score'), scoreTolerance);
    expect(groups.map(({ forecast, weight, observed }) => [forecast, weight, Math.round(observed * weight)])).toEqual(
      one.bins,
    );
  });

  it.each(casesOf('binned'))('decomposes $id in ten bins, closed at either edge', (one) => {
    const forecasts = numbersOf(one, 'forecast');
    for (const [closed, field] of [
      ['right', 'ten_bins_right_closed'],
      ['left', 'ten_bins_left_closed'],
    ] as const) {
      const expected = partOf(one, field);
      const actual = binnedDecomposition(forecasts, outcomesOf(one), closed);
      expectWithin(actual.brierScore, numberOf(one, 'brier'), scoreTolerance);
      expectWithin(actual.reliability, numberOf(expected, 'reliability'), scoreTolerance);
      expectWithin(actual.resolution, numberOf(expected, 'resolution'), scoreTolerance);
      expectWithin(actual.withinBinVariance, numberOf(expected, 'within_bin_variance'), scoreTolerance);
      expectWithin(actual.withinBinCovariance, numberOf(expected, 'within_bin_covariance'), scoreTolerance);
      const { reliability, resolution, uncertainty, withinBinVariance, withinBinCovariance } = actual;
      const sum = reliability - resolution + uncertainty + withinBinVariance - withinBinCovariance;
      expectWithin(sum, actual.brierScore, scoreTolerance);
    }
    expectWithin(meanLogScore(forecasts, outcomesOf(one)), numberOf(one, 'log_score'), scoreTolerance);
    const { brierScore, uncertainty } = binnedDecomposition(forecasts, outcomesOf(one));
    expectWithin(
      brierSkill({ score: brierScore, referenceScore: uncertainty }) ?? NaN,
      numberOf(one, 'skill'),
      scoreTolerance,
    );
  });

  it.each(casesOf('binned'))('puts the forecasts of $id into the right-closed bins', (one) => {
    const { bins } = binnedDecomposition(numbersOf(one, 'forecast'), outcomesOf(one), 'right');
    const expected = partOf(one, 'ten_bins_right_closed').bins;
    if (!Array.isArray(expected)) throw new Error('no bins');
    expect(bins.map(({ bin, count }) => [bin, count])).toEqual(expected.map(([bin, count]) => [bin, count]));
    for (const [index, [, , forecast, observed]] of expected.entries()) {
      expectWithin(bins[index]?.forecast ?? NaN, forecast, scoreTolerance);
      expectWithin(bins[index]?.observed ?? NaN, observed, scoreTolerance);
    }
  });

  it.each(casesOf('binned'))('has the other score of $id when forecasts become the midpoints of their bins', (one) => {
    const midpoints = numbersOf(one, 'forecast').map((forecast) => (2 * tenBinOf(forecast, 'right') + 1) / 20);
    const expected = partOf(one, 'r_verification_midpoints');
    const actual = murphyDecomposition(midpoints, outcomesOf(one));
    expectWithin(actual.brierScore, numberOf(expected, 'brier'), scoreTolerance);
    expectWithin(actual.reliability, numberOf(expected, 'reliability'), scoreTolerance);
    expectWithin(actual.resolution, numberOf(expected, 'resolution'), scoreTolerance);
    expectWithin(actual.uncertainty, numberOf(expected, 'uncertainty'), scoreTolerance);
  });

  it.each(casesOf('wilks-table'))('decomposes the forecasts of $id', (one) => {
    const [values, observed, shares] = ['forecast_values', 'event_frequency', 'forecast_share'].map((field) =>
      numbersOf(one, field),
    );
    const groups = (values ?? []).map((forecast, index) => ({
      forecast,
      weight: shares?.[index] ?? NaN,
      observed: observed?.[index] ?? NaN,
    }));
    const { brierScore, reliability, resolution, uncertainty, baseRate } = murphyFromGroups(groups);
    expectWithin(baseRate, numberOf(one, 'event_rate'), scoreTolerance);
    expectWithin(reliability, numberOf(one, 'reliability'), scoreTolerance);
    expectWithin(resolution, numberOf(one, 'resolution'), scoreTolerance);
    expectWithin(uncertainty, numberOf(one, 'uncertainty'), scoreTolerance);
    expectWithin(brierScore, numberOf(one, 'brier'), scoreTolerance);
    const skill = brierSkill({ score: brierScore, referenceScore: uncertainty });
    expectWithin(skill ?? NaN, numberOf(one, 'skill'), scoreTolerance);
  });

  it.each(casesOf('pit-ks'))('tests the uniformity of $id', (one) => {
    const values = numbersOf(one, 'pit');
    const exact = kolmogorovSmirnovTest(values, 'exact');
    expectWithin(exact.distance, numberOf(one, 'ks_D'), scoreTolerance);
    expectWithin(exact.pValue, numberOf(one, 'ks_p_exact'), pValueTolerance);
    expectWithin(kolmogorovSmirnovTest(values, 'asymptotic').pValue, numberOf(one, 'ks_p_asymptotic'), pValueTolerance);
    const { binCounts, chiSquare } = transformUniformity(values);
    expect(binCounts).toEqual(one.counts_10_bins);
    expectWithin(chiSquare.statistic, numberOf(one, 'chisq_9df'), scoreTolerance);
    expectWithin(chiSquare.pValue, numberOf(one, 'chisq_p'), pValueTolerance);
  });

  it.each(casesOf('pit-lognormal'))('places $id in its lognormal distribution', (one) => {
    // The file's years and annual volatility stand for sessions and daily volatility: only their product matters.
    const [sessions, dailyVolatility] = [numberOf(one, 'T'), numberOf(one, 'sigma')];
    const { percentile } = realisedMove({
      startPrice: numberOf(one, 'S0'),
      endPrice: numberOf(one, 'S_T'),
      dailyVolatility,
      sessions,
      logDrift: (numberOf(one, 'drift') - dailyVolatility ** 2 / 2) * sessions,
    });
    expectWithin(percentile, numberOf(one, 'pit'), 1e-9);
  });

  it.each(casesOf('coverage'))('tests the coverage of $id', (one) => {
    const [hits, count, stated] = [numberOf(one, 'hits'), numberOf(one, 'n'), numberOf(one, 'p0')];
    expectWithin(
      exactCoverageTest({ hits, count, stated }),
      numberOf(one, 'p_value_two_sided_exact'),
      coverageTolerance,
    );
    const { low, high } = exactInterval({ hits, count });
    expectWithin(low, numberOf(one, 'ci95_low'), coverageTolerance);
    expectWithin(high, numberOf(one, 'ci95_high'), coverageTolerance);
    const { likelihoodRatio, pValue } = kupiecTest({ hits, count, stated });
    expectWithin(likelihoodRatio, numberOf(one, 'kupiec_lr'), coverageTolerance);
    expectWithin(pValue, numberOf(one, 'kupiec_p'), coverageTolerance);
  });

  it.each(casesOf('kupiec-table'))('accepts the counts between those of $id', (one) => {
    const accepted = kupiecAcceptedHits({ count: numberOf(one, 'n'), stated: numberOf(one, 'p0') });
    expect(accepted).toEqual({
      lowest: numberOf(one, 'computed_greater_than') + 1,
      highest: numberOf(one, 'computed_less_than') - 1,
    });
  });

  it.each(casesOf('crps-normal'))('has the ranked score of $id', (one) => {
    const expected = numberOf(one, 'crps');
    const actual = normalRankedScore({
      mean: numberOf(one, 'mean'),
      standardDeviation: numberOf(one, 'sd'),
      observed: numberOf(one, 'obs'),
    });
    expectWithin(actual, expected, 1e-9 * expected);
  });
});
