import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { z } from 'zod';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { seededRandom } from '@/journal/random/seeded-random';
import { expectWithin } from '@/tests/reference/reference-file';

const figures = {
  price: z.number(),
  delta: z.number(),
  gamma: z.number(),
  vegaPerDailyPoint: z.number(),
  thetaPerSession: z.number(),
  rhoPerPercent: z.number(),
  oddsInTheMoney: z.number(),
};
const answerSchema = z.array(z.object(figures));

const random = seededRandom(20_261_209);
const between = (least: number, most: number) => least + (most - least) * random.uniform();
const cases = Array.from({ length: 2_000 }, () => ({
  type: random.uniform() < 0.5 ? ('call' as const) : ('put' as const),
  spotPrice: between(5, 500),
  strikePrice: 0,
  dailyVolatility: between(0.003, 0.06),
  sessions: between(0.1, 45),
  years: between(0.0003, 0.18),
  ratePerYear: between(-0.02, 0.08),
  dividendYield: between(0, 0.05),
  yearsPerNextSession: random.uniform() < 0.8 ? 1 / 365 : 3 / 365,
})).map((option) => ({
  ...option,
  // Strikes within three standard deviations: further out the port's own normal distribution loses its digits.
  strikePrice: option.spotPrice * Math.exp(between(-3, 3) * option.dailyVolatility * Math.sqrt(option.sessions)),
}));

describe('the QuantLib port as an independent voice', () => {
  const { status, stdout, stderr } = spawnSync(process.execPath, [path.join(__dirname, 'quantlib-voice.mjs')], {
    input: JSON.stringify(cases),
    encoding: 'utf8',
    maxBuffer: 16 * 1024 * 1024,
  });
  if (status !== 0) throw new Error(stderr.slice(-2_000));
  const answers = answerSchema.parse(JSON.parse(stdout));

  it('agrees on price, five Greeks and odds of 2,000 seeded random options', () => {
    expect(answers).toHaveLength(cases.length);
    for (const [index, { yearsPerNextSession, ...option }] of cases.entries()) {
      const theirs = answers[index];
      if (theirs === undefined) throw new Error('an answer is missing');
      const ours = europeanOptionValue(option, yearsPerNextSession);
      // Their normal distribution is good to 1e-15 of 1, not of a tail.
      const { spotPrice, sessions, years, dailyVolatility } = option;
      const largestGamma = 0.4 / (spotPrice * dailyVolatility * Math.sqrt(sessions));
      expectWithin(ours.price, theirs.price, 1e-13 * spotPrice);
      expectWithin(ours.delta, theirs.delta, 1e-12);
      expectWithin(ours.gamma, theirs.gamma, 1e-12 * largestGamma);
      expectWithin(ours.vegaPerDailyPoint, theirs.vegaPerDailyPoint, 1e-14 * spotPrice * Math.sqrt(sessions));
      expectWithin(ours.thetaPerSession, theirs.thetaPerSession, 2e-13 * spotPrice);
      expectWithin(ours.rhoPerPercent, theirs.rhoPerPercent, 1e-14 * spotPrice * years);
      expectWithin(ours.oddsInTheMoney, theirs.oddsInTheMoney, 1e-12);
    }
  });
});
