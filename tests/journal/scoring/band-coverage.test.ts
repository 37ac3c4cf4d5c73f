import { normalCumulative, normalQuantile } from '@/journal/distributions/normal-distribution';
import { bandCoverage } from '@/journal/scoring/band-coverage';
import { christoffersenTest } from '@/journal/scoring/christoffersen-test';

const evenPlaces = (count: number) => Array.from({ length: count }, (_, index) => (index + 0.5) / count);

describe('bandCoverage', () => {
  it('finds the stated shares where outcomes fall evenly', () => {
    const [one, two, three] = bandCoverage(evenPlaces(10_000));
    expect(one?.stated).toBeCloseTo(0.682689492137086, 14);
    expect(two?.stated).toBeCloseTo(0.954499736103642, 14);
    expect(three?.stated).toBeCloseTo(0.99730020393674, 14);
    for (const band of [one, two, three]) expect(band?.observed).toBeCloseTo(band?.stated ?? NaN, 3);
  });

  it('falls to 57.6 % and 89.0 % where the true deviation is 1.25 times the stated one', () => {
    const places = evenPlaces(20_000).map((place) => normalCumulative(1.25 * normalQuantile(place)));
    const [one, two] = bandCoverage(places);
    expect(one?.observed).toBeCloseTo(0.576, 3);
    expect(two?.observed).toBeCloseTo(0.89, 3);
    expect(one?.kupiec.pValue).toBeLessThan(1e-6);
  });

  it('gives 9 of 12 within 1 standard deviation its Wilson interval, 46.8 to 91.1 %', () => {
    const places = [0.2, 0.3, 0.4, 0.45, 0.5, 0.55, 0.6, 0.7, 0.8, 0.05, 0.95, 0.99];
    const [one] = bandCoverage(places, [1]);
    expect([one?.hits, one?.count]).toEqual([9, 12]);
    expect(one?.low).toBeCloseTo(0.468, 3);
    expect(one?.high).toBeCloseTo(0.911, 3);
  });

  it('gives 28 of 48 44.3 to 71.2 %, which holds 68.3 %', () => {
    const places = [...new Array<number>(28).fill(0.5), ...new Array<number>(20).fill(0.01)];
    const [one] = bandCoverage(places, [1]);
    expect(one?.low).toBeCloseTo(0.443, 3);
    expect(one?.high).toBeCloseTo(0.712, 3);
  });

  it('judges a band too wide to be missed, and a single outcome', () => {
    const [wide] = bandCoverage([0.5], [40]);
    expect(wide).toMatchObject({ hits: 1, count: 1, observed: 1, clustering: null });
    expect(Number.isFinite(wide?.kupiec.likelihoodRatio)).toBe(true);
  });

  it('refuses none, a place outside 0 to 1 and a band without width', () => {
    expect(() => bandCoverage([])).toThrow(expect.objectContaining({ code: 'values-missing' }));
    expect(() => bandCoverage([0.5, NaN])).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
    expect(() => bandCoverage([0.5], [0])).toThrow(expect.objectContaining({ code: 'deviations-invalid' }));
  });
});

describe('christoffersenTest', () => {
  const sequence = (text: string) => [...text].map((sign) => sign === '1');

  it('has the likelihood ratio worked out with numpy and the p value of scipy 1.17 for 20 outcomes', () => {
    const test = christoffersenTest(sequence('00110001110000010000'));
    expect(test?.likelihoodRatio).toBeCloseTo(1.3358104147583951, 12);
    expect(test?.pValue).toBeCloseTo(0.2477741635278911, 12);
    expect([test?.rateAfterHit, test?.rateAfterMiss]).toEqual([3 / 13, 0.5]);
  });

  it('sees misses that come together', () => {
    expect(christoffersenTest(sequence('0'.repeat(60) + '1'.repeat(8) + '0'.repeat(40)))?.pValue).toBeLessThan(1e-6);
  });

  it('cannot tell without a miss that has a follower', () => {
    expect(christoffersenTest(sequence('0000'))).toBeNull();
    expect(christoffersenTest(sequence('0001'))).toBeNull();
    expect(() => christoffersenTest([true])).toThrow(expect.objectContaining({ code: 'too-few-values' }));
  });
});
