import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { z } from 'zod';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { seededRandom } from '@/server/demo/seeded-random';
import { expectWithin } from '@/tests/reference/reference-file';

const answerSchema = z.array(
  z.object({ price: z.number(), delta: z.number(), gamma: z.number(), oddsInTheMoney: z.number() }),
);

const random = seededRandom(20_261_209);
const between = (least: number, most: number) => least + (most - least) * random.next();
const options = Array.from({ length: 300 }, () => ({
  type: random.next() < 0.5 ? ('call' as const) : ('put' as const),
  spotPrice: between(5, 500),
  strikePrice: 0,
  dailyVolatility: between(0.003, 0.06),
  sessions: between(0.1, 45),
  years: between(0.0003, 0.18),
  ratePerYear: between(-0.02, 0.08),
  dividendYield: between(0, 0.05),
})).map((option) => ({
  ...option,
  // Strikes within three standard deviations: further out the port's own normal distribution loses its digits.
  strikePrice: option.spotPrice * Math.exp(between(-3, 3) * option.dailyVolatility * Math.sqrt(option.sessions)),
}));

describe('the QuantLib port as an independent voice', () => {
  const cases = options.map(({ dailyVolatility, sessions, ...option }) => ({
    ...option,
    totalDeviation: dailyVolatility * Math.sqrt(sessions),
  }));
  const { status, stdout, stderr } = spawnSync(process.execPath, [path.join(__dirname, 'quantlib-voice.mjs')], {
    input: JSON.stringify(cases),
    encoding: 'utf8',
    maxBuffer: 16 * 1024 * 1024,
  });
  if (status !== 0) throw new Error(stderr.slice(-2_000));
  const answers = answerSchema.parse(JSON.parse(stdout));

  it('agrees on price, delta, gamma and odds of 300 seeded random options', () => {
    expect(answers).toHaveLength(options.length);
    for (const [index, option] of options.entries()) {
      const theirs = answers[index];
      if (theirs === undefined) throw new Error('an answer is missing');
      const ours = europeanOptionValue(option);
      expectWithin(ours.price, theirs.price, 1e-12 * option.spotPrice);
      expectWithin(ours.delta, theirs.delta, 1e-11);
      expectWithin(ours.gamma, theirs.gamma, 1e-9 * Math.max(1e-3, theirs.gamma));
      expectWithin(ours.oddsInTheMoney, theirs.oddsInTheMoney, 1e-11);
    }
  });
});
