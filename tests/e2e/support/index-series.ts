import { readFileSync } from 'node:fs';
import path from 'node:path';
import { addSessions, previousSession } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

/** Closes of a published index series (EuStockMarkets of R; its source line stands in the file), in its own order. */
export function publishedCloses(): number[] {
  const text = readFileSync(path.join(__dirname, '../../reference/data/eustockmarkets_dax_smi.csv'), 'utf8');
  return text
    .split('\n')
    .filter((line) => /^\d/.test(line))
    .map((line) => Number(line.split(',')[2]));
}

/** Session dates for a run of closes that ends on a date. */
export function sessionDatesEnding(last: string, count: number): string[] {
  const dates = [last];
  while (dates.length < count) dates.unshift(previousSession(usOptionsCalendar, dates[0] ?? last).date);
  return dates;
}

/** The session dates that follow. */
export function sessionDatesAfter(date: string, count: number): string[] {
  return Array.from({ length: count }, (_, index) => addSessions(usOptionsCalendar, date, index + 1).date);
}

export function csvOf(dates: readonly string[], closes: readonly number[]): Buffer {
  return Buffer.from(['Date,Close', ...dates.map((date, index) => `${date},${closes[index]}`)].join('\n'));
}
