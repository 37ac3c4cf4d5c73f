import { type UnderlyingFields } from '@/server/underlyings/underlying-store';

/** An invented desk: people, symbols and numbers are ours, and none stands for anything real. */
export const demoDesk = { name: 'Alder Lane', currency: 'USD', password: 'bramble hedge lantern' } as const;

export const demoPeople = [
  { key: 'trader', email: 'mara@alderlane.example', displayName: 'Mara Quill', role: 'trader' },
  { key: 'mentor', email: 'jonas@alderlane.example', displayName: 'Jonas Feld', role: 'mentor' },
  { key: 'lead', email: 'ida@alderlane.example', displayName: 'Ida Wren', role: 'lead' },
] as const;

export interface DemoUnderlying {
  readonly fields: UnderlyingFields;
  readonly startPrice: number;
  /** Long-run standard deviation of one session. */
  readonly dailyVolatility: number;
  /** Distance between strikes. */
  readonly strikeStep: number;
}

const shares = {
  style: 'american',
  settlement: 'physical',
  settlementTime: 'pm',
  multiplier: '100',
  dividendYield: 0,
  currency: 'USD',
} as const;
const index = { ...shares, style: 'european', settlement: 'cash' } as const;

export const demoUnderlyings: readonly DemoUnderlying[] = [
  {
    fields: { ...shares, symbol: 'JQVO', name: 'Juniper Quarry and Vale' },
    startPrice: 88,
    dailyVolatility: 0.0145,
    strikeStep: 1,
  },
  {
    fields: { ...shares, symbol: 'HVYQ', name: 'Heavy Quay Lines' },
    startPrice: 96,
    dailyVolatility: 0.0155,
    strikeStep: 1,
  },
  {
    fields: { ...index, symbol: 'ZZIX', name: 'Zenith Zone index' },
    startPrice: 3720,
    dailyVolatility: 0.0088,
    strikeStep: 10,
  },
  {
    fields: { ...shares, symbol: 'WUVZ', name: 'Willow Under Vines', dividendYield: 0.012 },
    startPrice: 61,
    dailyVolatility: 0.0125,
    strikeStep: 1,
  },
  {
    fields: { ...shares, symbol: 'XJKO', name: 'Xylo Joinery', dividendYield: 0.018 },
    startPrice: 49,
    dailyVolatility: 0.0152,
    strikeStep: 1,
  },
  {
    fields: { ...shares, symbol: 'QYBD', name: 'Quayside Bread' },
    startPrice: 77,
    dailyVolatility: 0.0162,
    strikeStep: 1,
  },
];

export const demoIdeas = [
  'Two weeks of narrow range; a close outside it within the hold, or I am wrong.',
  'The short windows read calmer than the quarter. I sell what the market still pays for last month.',
  'Support held three times. I want to be paid for it holding once more.',
  'Implied volatility is below every rung of the ladder. I buy the wings.',
  'No event inside the hold. Time should do the work.',
  'Trend intact above the 63-session mean; defined risk in case it breaks.',
] as const;

export const demoLessons = [
  'The move came after my exit. The time stop was right, the hold too short for this underlying.',
  'I paid above the limit. Next time: one re-quote, then skip.',
  'Closed by the written rule. Nothing to change.',
  'The window of ten was too jumpy to plan on. I go back to 63.',
  'Odds of 80% are still one loss in five. Size was right for that.',
] as const;

export const demoTags = ['range', 'trend', 'calm', 'wings', 'rule-based', 'index'] as const;
