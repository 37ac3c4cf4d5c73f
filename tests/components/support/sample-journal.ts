import { type SealedEntry } from '@/components/entry/sealed-entry';
import { previewPlan } from '@/hooks/entries/preview-plan';
import { previousSession } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';
import { type Entry, type EntryFill, type EntryRow } from '@/shared/entries/entry';
import { forecastInputSchema, forecastSchema } from '@/shared/entries/forecast-schema';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

const idOf = (number: number) => `01930000-0000-7000-8000-${String(number).padStart(12, '0')}`;
export const ids = { entry: idOf(1), underlying: idOf(2), trader: idOf(3), upload: idOf(4), desk: idOf(5) } as const;

const LAST_BAR = '2026-12-09';

function barsEnding(last: string, count: number): UnderlyingDetail['bars'] {
  const dates = [last];
  while (dates.length < count) dates.unshift(previousSession(usOptionsCalendar, dates[0] ?? last).date);
  return dates.map((sessionDate, index) => ({
    sessionDate,
    close: (100 + 2 * Math.sin(index)).toFixed(2),
    open: null,
    high: null,
    low: null,
    settlement: null,
    source: 'upload',
    storedAt: '2026-12-09T22:00:00.000Z',
  }));
}

export const sampleDetail: UnderlyingDetail = {
  underlying: {
    id: ids.underlying,
    version: 1,
    symbol: 'ZZIX',
    name: '',
    style: 'european',
    settlement: 'cash',
    settlementTime: 'pm',
    multiplier: '100',
    dividendYield: 0,
    currency: 'USD',
  },
  bars: barsEnding(LAST_BAR, 40),
  barCount: 40,
  sessionsBehind: 0,
};

export const sampleLeg = (changes: Partial<DraftLeg> = {}): DraftLeg => ({
  id: idOf(10),
  side: 'buy',
  type: 'call',
  strikePrice: '101',
  expirySessionDate: '2026-12-23',
  quantity: '3',
  premium: '1.20',
  ...changes,
});

export const samplePlan = (legs: DraftLeg[]): DraftPlan => ({
  underlyingId: ids.underlying,
  spotPrice: '',
  spotAt: '',
  legs,
  holding: 'toExpiry',
  holdingSessions: '',
  volatility: { source: 'window', window: 21, lowPercent: '', basePercent: '', highPercent: '', reason: '' },
  drift: { kind: 'zeroReturn', expectedReturnPercent: '', reason: '' },
  ratePercent: '4',
  overnightSharePercent: '30',
  feePerContract: '0.65',
  targetPrice: '',
  stopPrice: '',
  idea: '',
  exitRule: '',
  tags: [],
});

export const sampleRow = (changes: Partial<EntryRow> = {}): EntryRow => ({
  id: ids.entry,
  version: 3,
  state: 'draft',
  trader: { id: ids.trader, displayName: 'Ada Thorn' },
  underlying: { id: ids.underlying, symbol: 'ZZIX', currency: 'USD' },
  structureName: 'long 3 × 101 call',
  tags: [],
  createdAt: '2026-12-09T22:00:00.000Z',
  sealedAt: null,
  isLateSeal: false,
  firstFillAt: null,
  lastFillAt: null,
  expirySessionDate: '2026-12-23',
  exitSessionDate: '2026-12-23',
  holdingSessions: 10,
  strip: null,
  realisedProfit: null,
  expectedMean: null,
  needsLesson: false,
  ...changes,
});

export const sampleDraft = (legs: DraftLeg[], row: Partial<EntryRow> = {}): Entry => ({
  row: sampleRow(row),
  plan: samplePlan(legs),
  planSavedAt: '2026-12-09T22:10:00.000Z',
  sealed: null,
  fills: [],
  outcome: null,
  history: [],
  lesson: '',
  isOwn: true,
});

/** A bought call, sealed, with its fills; the forecast is the engine's own. */
export function sampleSealed(fills: EntryFill[], row: Partial<EntryRow> = {}): SealedEntry {
  const draft = sampleDraft([sampleLeg()], { state: 'open', sealedAt: '2026-12-09T22:15:00.000Z', ...row });
  const preview = previewPlan(draft.plan, sampleDetail);
  if (preview.kind !== 'ready') throw new Error('The sample plan is complete.');
  const receipt = {
    forecastId: idOf(20),
    sequence: 1,
    sealedAt: '2026-12-09T22:15:00.000Z',
    hash: 'a'.repeat(64),
    previousHash: '0'.repeat(64),
    engineVersion: '1',
    isLate: false,
  };
  return {
    ...draft,
    fills,
    sealed: {
      receipt,
      input: forecastInputSchema.parse(preview.input),
      forecast: forecastSchema.parse(preview.forecast),
    },
  };
}

export const sampleFill = (changes: Partial<EntryFill> = {}): EntryFill => ({
  id: idOf(30),
  kind: 'buy',
  instrument: {
    kind: 'option',
    underlyingSymbol: 'ZZIX',
    expirySessionDate: '2026-12-23',
    type: 'call',
    strikePrice: '101',
    multiplier: '100',
  },
  quantity: '3',
  price: '1.20',
  fees: '1.95',
  tradedAt: '2026-12-10T15:30:00.000Z',
  timeZone: 'America/New_York',
  sequence: 1,
  cash: '-361.95',
  underlyingPrice: null,
  midPrice: null,
  madeBy: null,
  ...changes,
});

/** The one trader of a desk of one. */
export const sampleMe = {
  person: { id: ids.trader, email: 'ada@example.org', displayName: 'Ada Thorn', timeZone: 'UTC' },
  desk: {
    id: ids.desk,
    role: 'lead',
    settings: {
      name: 'Hedge End',
      currency: 'USD',
      ratePerYear: 0.04,
      overnightShare: 0.3,
      feePerContract: '0.65',
      version: 1,
    },
  },
  desks: [{ id: ids.desk, name: 'Hedge End', role: 'lead' }],
  serverTime: '2026-12-09T22:20:00.000Z',
};
