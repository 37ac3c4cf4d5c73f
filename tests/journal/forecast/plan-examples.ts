import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

/** The close of a session, as an instant. */
export function closeOf(date: string): string {
  const session = usOptionsCalendar.sessionOn(date);
  if (session === null) throw new Error(`${date} is no session`);
  return session.closesAt;
}

/** A long 102 call on an invented underlying: spot 100 after a close, ten sessions and fourteen days to expiry. */
export const longCall: ForecastInput = {
  underlying: {
    symbol: 'JQVO',
    style: 'european',
    settlement: 'cash',
    settlementTime: 'pm',
    multiplier: '100',
    dividendYield: 0,
  },
  spot: { price: '100', at: closeOf('2026-12-09'), source: 'bar' },
  legs: [
    {
      id: '01940000-0000-7000-8000-00000000000a',
      side: 'buy',
      type: 'call',
      strikePrice: '102',
      expirySessionDate: '2026-12-23',
      quantity: 1,
      premium: '1.20',
    },
  ],
  holding: { kind: 'toExpiry' },
  volatility: {
    source: 'window',
    window: 20,
    lambda: null,
    low: 0.0114,
    base: 0.015,
    high: 0.0219,
    lastSessionDate: '2026-12-09',
  },
  drift: { kind: 'zeroReturn' },
  ratePerYear: 0,
  overnightShare: 0.3,
  feePerContract: '0.65',
  targetPrice: null,
  stopPrice: null,
};

const [callLeg] = longCall.legs;
if (callLeg === undefined) throw new Error('the example has one leg');

/** A bull put 97 / 95 for a credit of 0.55 on the same underlying. */
export const bullPut: ForecastInput = {
  ...longCall,
  legs: [
    { ...callLeg, side: 'sell', type: 'put', strikePrice: '97', premium: '1.36' },
    {
      ...callLeg,
      id: '01940000-0000-7000-8000-00000000000b',
      side: 'buy',
      type: 'put',
      strikePrice: '95',
      premium: '0.81',
    },
  ],
};
