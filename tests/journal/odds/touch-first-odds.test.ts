import fc from 'fast-check';
import { touchFirstOddsAtCloses, touchOddsAtCloses } from '@/journal/odds/monitored-at-closes';
import { touchFirstOdds } from '@/journal/odds/touch-first-odds';
import { touchOdds } from '@/journal/odds/touch-odds';
import { seededRandom } from '@/journal/random/seeded-random';
import { runs } from '@/tests/journal/deep-runs';
import { drawFrom } from '@/tests/journal/any-input/draw';
import { verdictOn } from '@/tests/journal/any-input/answers-cleanly';

const seed = 20261201;
const corridor = (up: number, down: number, totalDeviation: number, logDrift: number) => ({
  spotPrice: 100,
  upperLevel: 100 * Math.exp(up),
  lowerLevel: 100 * Math.exp(-down),
  totalDeviation,
  logDrift,
});
const anyCorridor = fc
  .record({
    up: fc.double({ min: 0.05, max: 5, noNaN: true }),
    down: fc.double({ min: 0.05, max: 5, noNaN: true }),
    deviation: fc.double({ min: 0.001, max: 1, noNaN: true }),
    drift: fc.double({ min: -4, max: 4, noNaN: true }),
  })
  .map(({ up, down, deviation, drift }) => corridor(up * deviation, down * deviation, deviation, drift * deviation));

/** Bridges say whether a level was passed between two points of a path. */
function simulate({ up, down, drift, paths }: { up: number; down: number; drift: number; paths: number }) {
  const random = seededRandom(7);
  const steps = 64;
  const step = 1 / steps;
  const first = { upper: 0, lower: 0 };
  for (let path = 0; path < paths; path += 1) {
    let at = 0;
    for (let count = 0; count < steps; count += 1) {
      const next = at + drift * step + Math.sqrt(step) * random.normal();
      const passes = (level: number, before: number, after: number) =>
        after >= level || random.uniform() < Math.exp((-2 * (level - before) * (level - after)) / step);
      if (passes(up, at, next)) {
        first.upper += 1;
        break;
      }
      if (passes(down, -at, -next)) {
        first.lower += 1;
        break;
      }
      at = next;
    }
  }
  return { upper: first.upper / paths, lower: first.lower / paths };
}

describe('touching one of two levels first', () => {
  it.each([
    { up: 0.5, down: 0.4, drift: 0 },
    { up: 0.9, down: 1.4, drift: 0.6 },
    { up: 1.5, down: 0.7, drift: -0.8 },
    { up: 0.3, down: 1.1, drift: -2 },
  ])('agrees with bridged paths at $up and $down with drift $drift', (one) => {
    const paths = runs(20_000, 400_000);
    const { upper, lower } = simulate({ ...one, paths });
    const odds = touchFirstOdds(corridor(one.up, one.down, 1, one.drift));
    const margin = 4 * Math.sqrt(0.25 / paths) + 0.002; // both levels within one step are told apart by their order only
    expect(Math.abs(odds.upperFirst - upper)).toBeLessThanOrEqual(margin);
    expect(Math.abs(odds.lowerFirst - lower)).toBeLessThanOrEqual(margin);
  });

  it('sums to 1, each within 0 and 1', () => {
    fc.assert(
      fc.property(anyCorridor, (question) => {
        const { upperFirst, lowerFirst, neither } = touchFirstOdds(question);
        expect(Math.abs(upperFirst + lowerFirst + neither - 1)).toBeLessThanOrEqual(1e-13);
        for (const odds of [upperFirst, lowerFirst, neither]) {
          expect(odds).toBeGreaterThanOrEqual(0);
          expect(odds).toBeLessThanOrEqual(1);
        }
      }),
      { seed, numRuns: runs(300, 20_000) },
    );
  });

  it('runs on smoothly where images give way to waves', () => {
    for (const drift of [-3, -0.5, 0, 0.5, 3])
      for (const share of [0.1, 0.4, 0.5, 0.8]) {
        const width = 2;
        const at = (scale: number) =>
          touchFirstOdds(corridor(width * share * scale, width * (1 - share) * scale, 1, drift));
        const [narrow, wide] = [at(1 - 1e-12), at(1 + 1e-12)];
        expect(Math.abs(narrow.upperFirst - wide.upperFirst)).toBeLessThanOrEqual(2e-11);
        expect(Math.abs(narrow.neither - wide.neither)).toBeLessThanOrEqual(2e-11);
      }
  });

  it('is the odds of touching the one where the other lies far away', () => {
    fc.assert(
      fc.property(anyCorridor, (question) => {
        const far = { ...question, lowerLevel: question.spotPrice * Math.exp(-60 * question.totalDeviation) };
        const single = touchOdds({ ...question, level: question.upperLevel });
        expect(Math.abs(touchFirstOdds(far).upperFirst - single)).toBeLessThanOrEqual(1e-13);
      }),
      { seed, numRuns: runs(300, 20_000) },
    );
  });

  it('tends to the odds without end of time', () => {
    const [up, down, drift] = [0.05, 0.03, 0.4];
    const { upperFirst, neither } = touchFirstOdds(corridor(up, down, 1, drift));
    const ruin = (1 - Math.exp(-2 * drift * down)) / (1 - Math.exp(-2 * drift * (up + down)));
    expect(Math.abs(upperFirst - ruin)).toBeLessThanOrEqual(1e-14);
    expect(neither).toBeLessThanOrEqual(1e-14);
    expect(touchFirstOdds(corridor(up, down, 1, 0)).upperFirst).toBeCloseTo(0.375, 13);
  });

  it('is mirrored with the levels and the drift', () => {
    fc.assert(
      fc.property(anyCorridor, (question) => {
        const { spotPrice, upperLevel, lowerLevel, logDrift } = question;
        const square = spotPrice * spotPrice;
        const mirrored = touchFirstOdds({
          ...question,
          upperLevel: square / lowerLevel,
          lowerLevel: square / upperLevel,
          logDrift: -logDrift,
        });
        expect(Math.abs(mirrored.upperFirst - touchFirstOdds(question).lowerFirst)).toBeLessThanOrEqual(
          // One rounding of a level counts as much as the deviation is small.
          1e-13 + 2e-15 / question.totalDeviation,
        );
      }),
      { seed, numRuns: runs(300, 20_000) },
    );
  });

  it('falls for the upper level as it moves away', () => {
    fc.assert(
      fc.property(anyCorridor, fc.double({ min: 1.001, max: 1.5, noNaN: true }), (question, factor) => {
        const further = touchFirstOdds({ ...question, upperLevel: question.upperLevel * factor });
        expect(further.upperFirst).toBeLessThanOrEqual(touchFirstOdds(question).upperFirst + 1e-13);
      }),
      { seed, numRuns: runs(300, 20_000) },
    );
  });

  it('lets the drift decide without deviation', () => {
    expect(touchFirstOdds(corridor(0.05, 0.05, 0, 0.06))).toEqual({ upperFirst: 1, lowerFirst: 0, neither: 0 });
    expect(touchFirstOdds(corridor(0.05, 0.05, 0, -0.06))).toEqual({ upperFirst: 0, lowerFirst: 1, neither: 0 });
    expect(touchFirstOdds(corridor(0.05, 0.05, 0, 0.01))).toEqual({ upperFirst: 0, lowerFirst: 0, neither: 1 });
  });

  it('gives numbers or touch-first-question-invalid for any input', () => {
    const draw = drawFrom(seededRandom(seed));
    for (let run = 0; run < runs(20_000, 1_000_000); run += 1) {
      const question = {
        spotPrice: draw.number(99, 101),
        lowerLevel: draw.number(90, 99),
        upperLevel: draw.number(101, 110),
        totalDeviation: draw.number(0, 0.3),
        logDrift: draw.number(-0.2, 0.2),
        closes: draw.whole(1, 30),
      };
      expect(verdictOn(() => touchFirstOdds(question))).not.toMatchObject({ kind: 'flawed' });
      expect(verdictOn(() => touchFirstOddsAtCloses(question))).not.toMatchObject({ kind: 'flawed' });
      expect(verdictOn(() => touchOddsAtCloses({ ...question, level: question.upperLevel }))).not.toMatchObject({
        kind: 'flawed',
      });
    }
  });
});
