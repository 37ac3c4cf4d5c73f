import { z } from 'zod';
import {
  decimalTextSchema,
  fractionSchema,
  idSchema,
  instantSchema,
  nonNegativeDecimalSchema,
  positiveDecimalSchema,
  sessionDateSchema,
} from '@/shared/contract/fields';

const number = z.number();
const lowBaseHighSchema = z.strictObject({ low: number, base: number, high: number });

/** A complete plan with its prices, as the engine takes it (journal/forecast/forecast-input). */
export const forecastInputSchema = z.strictObject({
  underlying: z.strictObject({
    symbol: z.string(),
    style: z.enum(['european', 'american']),
    settlement: z.enum(['cash', 'physical']),
    settlementTime: z.enum(['pm', 'am']),
    multiplier: positiveDecimalSchema,
    dividendYield: number,
  }),
  spot: z.strictObject({ price: positiveDecimalSchema, at: instantSchema, source: z.enum(['bar', 'typed']) }),
  legs: z
    .array(
      z.strictObject({
        id: idSchema,
        side: z.enum(['buy', 'sell']),
        type: z.enum(['call', 'put']),
        strikePrice: positiveDecimalSchema,
        expirySessionDate: sessionDateSchema,
        quantity: z.int().min(1),
        premium: nonNegativeDecimalSchema,
      }),
    )
    .min(1)
    .max(20),
  holding: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('toExpiry') }),
    z.strictObject({ kind: z.literal('sessions'), sessions: z.number().positive() }),
  ]),
  volatility: z.strictObject({
    source: z.enum(['window', 'ewma', 'typed']),
    window: z.int().nullable(),
    lambda: number.nullable(),
    low: z.number().positive(),
    base: z.number().positive(),
    high: z.number().positive(),
    lastSessionDate: sessionDateSchema.nullable(),
  }),
  drift: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('zeroReturn') }),
    z.strictObject({ kind: z.literal('riskNeutral') }),
    z.strictObject({ kind: z.literal('ownView'), expectedLogReturnPerSession: number }),
  ]),
  ratePerYear: number,
  overnightShare: fractionSchema,
  feePerContract: nonNegativeDecimalSchema,
  targetPrice: positiveDecimalSchema.nullable(),
  stopPrice: positiveDecimalSchema.nullable(),
});

const oddsEventSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('in-the-money'), legId: idSchema }),
  z.strictObject({ kind: z.literal('profit-at-expiry') }),
  z.strictObject({ kind: z.literal('profit-at-exit') }),
  z.strictObject({ kind: z.literal('touch-target'), level: positiveDecimalSchema }),
  z.strictObject({ kind: z.literal('touch-stop'), level: positiveDecimalSchema }),
]);

export const statedOddsSchema = z.strictObject({
  key: z.string(),
  event: oddsEventSchema,
  probability: lowBaseHighSchema,
  marketImplied: number.nullable(),
  dueSessionDate: sessionDateSchema,
});

const distributionSchema = z.strictObject({
  horizon: z.enum(['expiry', 'exit']),
  mean: lowBaseHighSchema,
  oddsOfProfit: lowBaseHighSchema,
  expectedShortfall: number,
  percentiles: z.array(z.strictObject({ percent: number, profit: number })),
  lumps: z.array(z.strictObject({ profit: number, probability: number })),
  classes: z.array(z.strictObject({ from: number, to: number, probability: number })),
});

/** The outputs of a plan (journal/forecast/forecast). */
export const forecastSchema = z.strictObject({
  engineVersion: z.string(),
  expirySessionDate: sessionDateSchema,
  exitSessionDate: sessionDateSchema,
  exitAt: instantSchema,
  sessions: z.strictObject({ toExpiry: number, holding: number }),
  years: z.strictObject({ toExpiry: number, holding: number }),
  totalDeviation: z.strictObject({ holding: lowBaseHighSchema, toExpiry: lowBaseHighSchema }),
  logDrift: z.strictObject({ holding: number, toExpiry: number }),
  forwardPrice: number,
  structureName: z.string(),
  cost: z.strictObject({
    netPremium: decimalTextSchema,
    feesToOpen: decimalTextSchema,
    feesToClose: decimalTextSchema,
    modelValue: lowBaseHighSchema,
  }),
  legs: z.array(
    z.strictObject({
      legId: idSchema,
      impliedDailyVolatility: number.nullable(),
      impliedNone: z.enum(['below-intrinsic', 'no-time-value', 'above-maximum', 'no-time-left']).nullable(),
      modelPrice: lowBaseHighSchema,
      greeks: z.strictObject({
        delta: number,
        gamma: number,
        vegaPerDailyPoint: number,
        thetaPerSession: number,
        rhoPerPercent: number,
      }),
    }),
  ),
  impliedDailyVolatility: number.nullable(),
  odds: z.array(statedOddsSchema),
  atExpiry: distributionSchema,
  atExit: distributionSchema.nullable(),
  ends: z.strictObject({
    greatestGain: number.nullable(),
    greatestLoss: number.nullable(),
    oddsOfGreatestGain: number,
    oddsOfGreatestLoss: number,
    breakEvens: z.array(number),
  }),
  lattice: z.strictObject({
    rows: z.array(z.strictObject({ sigma: number, price: number })),
    sessionsElapsed: z.array(number),
    profit: z.array(z.array(number)),
    likelihood: z.array(z.array(number)),
  }),
});
