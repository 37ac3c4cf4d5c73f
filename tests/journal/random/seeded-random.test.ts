import { chiSquareCumulative } from '@/journal/distributions/chi-square-distribution';
import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { seededRandom } from '@/journal/random/seeded-random';
import { splitMix64 } from '@/journal/random/split-mix';
import { xoshiro128 } from '@/journal/random/xoshiro';

const draw = <T>(next: () => T, count: number) => Array.from({ length: count }, () => next());

describe('the generators of words', () => {
  // Both sequences: reference C code of Vigna, as the tests of the Rust package rand_xoshiro 0.7.0 print them.
  it('gives the published words of SplitMix64', () => {
    expect(draw(splitMix64(1477776061723855037n), 6)).toEqual([
      1985237415132408290n,
      2979275885539914483n,
      13511426838097143398n,
      8488337342461049707n,
      15141737807933549159n,
      17093170987380407015n,
    ]);
  });

  it('gives the published words of xoshiro128**', () => {
    expect(draw(xoshiro128([1, 2, 3, 4]), 10)).toEqual([
      11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
    ]);
  });
});

describe('draws from a seed', () => {
  it('are the same for the same seed, as a number or a bigint, and others for its neighbour', () => {
    const first = draw(seededRandom(7).uniform, 5);
    expect(draw(seededRandom(7).uniform, 5)).toEqual(first);
    expect(draw(seededRandom(7n).uniform, 5)).toEqual(first);
    expect(draw(seededRandom(8).uniform, 5)).not.toEqual(first);
  });

  it('take negative and huge seeds', () => {
    expect(draw(seededRandom(-1).uniform, 3)).toEqual(draw(seededRandom(2n ** 64n - 1n).uniform, 3));
    expect(draw(seededRandom(2n ** 200n).uniform, 3)).toEqual(draw(seededRandom(0).uniform, 3));
  });

  it.each([0.5, Number.NaN, Infinity, 2 ** 53])('are refused for the seed %p', (seed) => {
    expect(() => seededRandom(seed)).toThrow(DomainError);
  });

  it('fill the unit interval evenly, without its ends', () => {
    const random = seededRandom(1);
    const counts = new Array<number>(100).fill(0);
    const total = 100_000;
    let outside = 0;
    for (let step = 0; step < total; step += 1) {
      const value = random.uniform();
      if (!(value > 0 && value < 1)) outside += 1;
      const cell = Math.floor(value * 100);
      counts[cell] = (counts[cell] ?? 0) + 1;
    }
    expect(outside).toBe(0);
    const expected = total / counts.length;
    const statistic = counts.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
    const probability = chiSquareCumulative(statistic, counts.length - 1);
    expect(probability).toBeGreaterThan(0.001);
    expect(probability).toBeLessThan(0.999);
  });

  it('follow the normal law within the Kolmogorov-Smirnov bound at 0.1 %, neighbours uncorrelated', () => {
    const count = 100_000;
    const values = draw(seededRandom(2).normal, count);
    const products = values.slice(1).reduce((sum, value, at) => sum + value * (values[at] ?? 0), 0);
    expect(Math.abs(products) / Math.sqrt(count)).toBeLessThan(3.3);
    const sorted = values.sort((left, right) => left - right);
    const distance = Math.max(...sorted.map((value, at) => Math.abs(normalCumulative(value) - (at + 0.5) / count)));
    expect(distance * Math.sqrt(count)).toBeLessThan(1.95);
  });

  it('give every whole number below the count as often', () => {
    const random = seededRandom(3);
    const counts = new Array<number>(7).fill(0);
    for (let step = 0; step < 70_000; step += 1) {
      const at = random.index(7);
      counts[at] = (counts[at] ?? 0) + 1;
    }
    const statistic = counts.reduce((sum, count) => sum + (count - 10_000) ** 2 / 10_000, 0);
    expect(chiSquareCumulative(statistic, 6)).toBeLessThan(0.999);
  });

  it('has no choice among one, and reaches all 2^32', () => {
    const random = seededRandom(4);
    expect(draw(() => random.index(1), 3)).toEqual([0, 0, 0]);
    const most = Math.max(...draw(() => random.index(2 ** 32), 1000));
    expect(most).toBeGreaterThan(2 ** 31);
  });

  it.each([0, -1, 1.5, Number.NaN, 2 ** 32 + 1])('refuse to choose among %p', (count) => {
    expect(() => seededRandom(5).index(count)).toThrow(DomainError);
  });
});
