import { seededRandom } from '@/journal/random/seeded-random';
import { verdictOn } from '@/tests/journal/any-input/answers-cleanly';
import { drawFrom } from '@/tests/journal/any-input/draw';
import { callsOfOptionsAndScores } from '@/tests/journal/any-input/calls-of-options-and-scores';
import { callsOfPlans } from '@/tests/journal/any-input/calls-of-plans';
import { callsOfVolatility } from '@/tests/journal/any-input/calls-of-volatility';
import { runs } from '@/tests/journal/deep-runs';

const callsOfTheCore = { ...callsOfOptionsAndScores, ...callsOfVolatility, ...callsOfPlans };
const callsInAll = runs(100_000, 1_000_000);
const callsEach = Math.ceil(callsInAll / Object.keys(callsOfTheCore).length);

describe('whatever it is given, the core answers with numbers or a documented error', () => {
  it.each(Object.entries(callsOfTheCore))('%s', (name, { prepare, cost }) => {
    const draw = drawFrom(seededRandom(20261201));
    let answered = 0;
    for (let run = 0; run < callsEach / cost; run += 1) {
      const { input, call } = prepare(draw);
      const verdict = verdictOn(call);
      if (verdict.kind === 'flawed') throw new Error(`${name} with ${show(input)}: ${verdict.flaw}`);
      if (verdict.kind === 'answered') answered += 1;
    }
    expect(answered).toBeGreaterThan(0.02 * (callsEach / cost)); // else the draws would show nothing
  });
});

/** JSON would hide what is not finite. */
function show(input: unknown): string {
  return JSON.stringify(input, (_, value: unknown) => {
    if (Object.is(value, -0)) return '-0';
    return typeof value === 'number' && !Number.isFinite(value) ? String(value) : value;
  });
}
