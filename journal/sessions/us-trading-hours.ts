import { type TradingHours, type TradingSegment } from '@/journal/sessions/trading-hours';

const regular: TradingSegment = { kind: 'regular', opens: '09:30', closes: '16:00' };
const regularEarly: TradingSegment = { kind: 'regular', opens: '09:30', closes: '13:00' };
const untilQuarterPast: TradingSegment = { kind: 'regular', opens: '09:30', closes: '16:15' };
const untilQuarterPastEarly: TradingSegment = { kind: 'regular', opens: '09:30', closes: '13:15' };
const tradingRule = 'exchange rule 5.1 on trading hours, read in part';

/**
 * Trading hours of US listed options, New York time. Begin dates from memory are round ones: earlier hours are not in the table.
 */
export const usTradingHours: readonly TradingHours[] = [
  {
    productClass: 'equity-options',
    name: 'Equity options',
    from: '2000-01-03',
    segments: [regular],
    earlyCloseSegments: [regularEarly],
    source: `${tradingRule}; begin date from memory`,
    fromMemory: false,
  },
  {
    productClass: 'broad-fund-and-index-options',
    name: 'Some broad fund and index options, a quarter of an hour longer',
    from: '2000-01-03',
    segments: [untilQuarterPast],
    earlyCloseSegments: [untilQuarterPastEarly],
    source: `${tradingRule}; 13:15 and begin date from memory`,
    fromMemory: true,
  },
  {
    productClass: 'expiring-pm-index-options',
    name: 'Index series settled at the close, on their last day',
    from: '2009-06-01',
    segments: [regular],
    earlyCloseSegments: [regularEarly],
    source: 'SR-CBOE-2009-020; begin date from memory',
    fromMemory: false,
  },
  {
    productClass: 'overnight-index-options',
    name: 'Some index options, overnight and late',
    from: '2022-05-02',
    segments: [
      { kind: 'overnight', opens: '20:15', closes: '09:25', opensDayBefore: true },
      untilQuarterPast,
      { kind: 'late', opens: '16:15', closes: '17:00' },
    ],
    earlyCloseSegments: [
      { kind: 'overnight', opens: '20:15', closes: '09:25', opensDayBefore: true },
      untilQuarterPastEarly,
    ],
    source: `${tradingRule}; times and begin date from memory`,
    fromMemory: true,
  },
  {
    productClass: 'eligible-large-equity-options',
    name: 'Eligible large equity options, regular hours',
    from: '2000-01-03',
    segments: [regular],
    earlyCloseSegments: [regularEarly],
    source: `${tradingRule}; begin date from memory`,
    fromMemory: false,
  },
  {
    productClass: 'eligible-large-equity-options',
    name: 'Eligible large equity options, before the open and after the close',
    from: null,
    segments: [
      { kind: 'early', opens: '07:30', closes: '09:25' },
      { kind: 'late', opens: '16:00', closes: '16:15' },
    ],
    earlyCloseSegments: [],
    source:
      'SR-CBOE-2025-079, 91 FR 33005, approved 2026-05-28, and FR 2026-13225 of 2026-07-01; begin date by exchange notice, not known',
    fromMemory: false,
  },
];
