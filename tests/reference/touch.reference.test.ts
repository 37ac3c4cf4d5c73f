import reference from '@/tests/reference/data/touch.json';
import { casesOf, expectWithin, numberOf, type ReferenceCase } from '@/tests/reference/reference-file';
import { type LevelQuestion } from '@/journal/odds/level-question';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { touchOdds } from '@/journal/odds/touch-odds';

function questionOf(one: ReferenceCase): LevelQuestion {
  const totalDeviation = numberOf(one, 'sigma') * Math.sqrt(numberOf(one, 'T'));
  return {
    spotPrice: numberOf(one, 'S'),
    level: numberOf(one, 'H'),
    totalDeviation,
    logDrift: numberOf(one, 'drift') * numberOf(one, 'T') - totalDeviation ** 2 / 2,
  };
}

describe('touch odds against outside values', () => {
  it.each(casesOf(reference, 'haug'))('has the printed probability of $id', (one) => {
    expectWithin(touchOdds(questionOf(one)), numberOf(one, 'prob_touch'), numberOf(one, 'tol'));
  });

  it.each(casesOf(reference, 'grid'))('has touch and finish beyond $H at $id', (one) => {
    const question = questionOf(one);
    const { above, below } = oddsBeyondLevel(question);
    const beyond = question.level > question.spotPrice ? above : below;
    expectWithin(touchOdds(question), numberOf(one, 'prob_touch'), 1e-9);
    expectWithin(beyond, numberOf(one, 'prob_beyond_at_T'), 1e-9);
  });

  it.each(casesOf(reference, 'grid'))('keeps the digits of the touch odds of $id, however small', (one) => {
    const expected = numberOf(one, 'prob_touch');
    expectWithin(touchOdds(questionOf(one)), expected, 6e-13 * expected); // measured 5.2e-13, from the rounding of ln(H/S)
  });
});
