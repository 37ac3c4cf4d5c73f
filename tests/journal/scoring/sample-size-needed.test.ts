import { binomialProbabilities } from '@/journal/scoring/event-count-distribution';
import { standOut } from '@/journal/scoring/false-discovery';
import { casesForMargin, casesToTellFrequency, casesToTellMean } from '@/journal/scoring/sample-size-needed';
import { studentCumulative } from '@/journal/distributions/student-distribution';

describe('cases needed', () => {
  it('to know a frequency to 10 and to 5 points: 97 and 385', () => {
    expect([casesForMargin(0.1), casesForMargin(0.05)]).toEqual([97, 385]);
  });

  it.each([
    [0.6, 257],
    [0.55, 101],
    [0.5, 54],
  ])('to tell a coverage of %f from 68.3 %%: %i', (actual, cases) => {
    expect(casesToTellFrequency({ stated: 0.6826894921, actual })).toBe(cases);
  });

  it('to tell a mean of 41.20 from zero with 310 a trade: 445', () => {
    expect(casesToTellMean({ mean: 41.2, standardDeviation: 310 })).toBe(445);
    expect(casesToTellMean({ mean: -41.2, standardDeviation: 310 })).toBe(445);
  });

  it('are refused for a margin, frequencies or a mean that need none or no number', () => {
    expect(() => casesForMargin(0)).toThrow(expect.objectContaining({ code: 'margin-invalid' }));
    expect(() => casesToTellFrequency({ stated: 0.5, actual: 0.5 })).toThrow(
      expect.objectContaining({ code: 'frequencies-invalid' }),
    );
    expect(() => casesToTellMean({ mean: 0, standardDeviation: 1 })).toThrow(
      expect.objectContaining({ code: 'mean-invalid' }),
    );
    expect(() => casesToTellMean({ mean: 1, standardDeviation: 1 }, { power: 1 })).toThrow(
      expect.objectContaining({ code: 'confidence-invalid' }),
    );
  });
});

describe('six of 48 beyond two standard deviations', () => {
  const atLeastSix = (probability: number) =>
    binomialProbabilities({ count: 48, probability })
      .slice(6)
      .reduce((sum, one) => sum + one, 0);

  it('have chance .021 if the deviation were known', () => {
    expect(atLeastSix(0.0455002639)).toBeCloseTo(0.0211614, 6);
  });

  it('have chance .066 if it was estimated from 20 returns', () => {
    expect(atLeastSix(2 * studentCumulative(-2, 19))).toBeCloseTo(0.0662188, 6);
  });
});

describe('standOut', () => {
  it('picks the four tests of the published example at 5 %', () => {
    // Benjamini and Hochberg (1995), section 3.1 (from memory): 15 tests of a heart-attack trial.
    const pValues = [
      0.0001, 0.0004, 0.0019, 0.0095, 0.0201, 0.0278, 0.0298, 0.0344, 0.0459, 0.324, 0.4262, 0.5719, 0.6528, 0.759, 1,
    ];
    expect(standOut(pValues).filter(Boolean)).toHaveLength(4);
    expect(standOut(pValues).slice(0, 5)).toEqual([true, true, true, true, false]);
  });

  it('keeps the order they came in, picks none of none, and refuses what is no p value', () => {
    expect(standOut([0.9, 0.001])).toEqual([false, true]);
    expect(standOut([0.9, 0.8])).toEqual([false, false]);
    expect(standOut([])).toEqual([]);
    expect(() => standOut([2])).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });
});
