import { Temporal } from 'temporal-polyfill';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { createDataSource } from '@/server/database/data-source';
import { DeskEntity } from '@/server/desk/desk-entity';
import { BarEntity } from '@/server/prices/bar-entity';
import { readPriceFile } from '@/server/prices/reading/read-price-file';
import { sealHash } from '@/server/seals/seal-hash';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { readFillForm } from '@/shared/entries/fill-form';
import { readPlan } from '@/shared/entries/read-plan';
import { day, makeWorkbook } from '@/tests/server/prices/make-workbook';
import { completePlan } from '@/tests/server/support/journal';

/** Days the clocks change on somewhere, the last of a year, and a leap day. */
const dates = ['2024-02-29', '2026-03-08', '2026-03-29', '2026-11-01', '2026-12-31'];
/** Both half past one of the night the clocks go back in New York, and the edges of a day. */
const instants = [
  '2026-11-01T05:30:00.000Z',
  '2026-11-01T06:30:00.000Z',
  '2026-03-08T07:00:00.000Z',
  '2026-12-31T23:59:59.999Z',
  '2027-01-01T00:00:00.000Z',
];
const idOf = (number: number) => `00000000-0000-4000-8000-00000000000${number}`;

/** Writes and reads times and dates in every way the server does, and prints what came back. */
async function main(url: string): Promise<void> {
  const dataSource = await createDataSource(url).initialize();
  try {
    const { manager } = dataSource;
    const desk = { version: 1, name: 'Desk', currency: 'USD', ratePerYear: 0, overnightShare: 0, feePerContract: '0' };
    for (const [index, instant] of instants.entries())
      await manager.insert(DeskEntity, { ...desk, id: idOf(index), createdAt: new Date(instant) });
    const underlying = {
      id: idOf(0),
      deskId: idOf(0),
      version: 1,
      symbol: 'HVYQ',
      name: 'Invented share',
      style: 'american' as const,
      settlement: 'physical' as const,
      settlementTime: 'pm' as const,
      multiplier: '100',
      dividendYield: 0,
      currency: 'USD',
    };
    await manager.insert(UnderlyingEntity, { ...underlying, createdAt: new Date(instants[0] ?? '') });
    for (const [index, sessionDate] of dates.entries()) {
      const rest = { open: null, high: null, low: null, settlement: null, source: 'typed' as const };
      const storedAt = new Date(instants[index] ?? '');
      await manager.insert(BarEntity, {
        id: idOf(index),
        deskId: idOf(0),
        underlyingId: idOf(0),
        sessionDate,
        close: '98.4',
        ...rest,
        storedAt,
      });
    }
    const bars = await manager.find(BarEntity, { order: { sessionDate: 'ASC' } });
    const asked = await manager.find(BarEntity, { where: { sessionDate: '2026-03-08' } });
    const csv = Buffer.from(`Date,Close\n${dates.map((date) => `${date},98.4\n`).join('')}`);
    const xlsx = await makeWorkbook({
      Prices: (sheet) => void sheet.addRows([['Date', 'Close'], ...dates.map((date) => [day(date), 98.4])]),
    });
    const fileOf = (bytes: Uint8Array, fileName: string) =>
      readPriceFile({ bytes, fileName, wanted: null, shown: null, now: '2026-12-31T22:00:00.000Z' });
    const { id, deskId, ...planned } = underlying;
    const reading = readPlan({
      draft: completePlan(id),
      underlying: { id, ...planned },
      bars: [{ sessionDate: '2026-12-09', close: '98.4' }],
      calendar: usOptionsCalendar,
    });
    if (reading.kind !== 'complete') throw new Error('The plan is complete.');
    const { legs, ...input } = reading.input;
    const steady = { ...input, legs: legs.map((leg, index) => ({ ...leg, id: idOf(index) })) };
    const at = (date: string, time: string) =>
      readFillForm(
        {
          kind: 'buy',
          contract: 'shares',
          quantity: '1',
          price: '1',
          fees: '0',
          date,
          time,
          timeZone: 'America/New_York',
          underlyingPrice: '',
          midPrice: '',
        },
        { id: idOf(9), input: steady },
      );
    const result = {
      desks: await manager.find(DeskEntity, { order: { id: 'ASC' } }),
      barsByOrm: bars.map(({ sessionDate, storedAt }) => [sessionDate, storedAt.toISOString()]),
      barsAsked: asked.map(({ sessionDate }) => sessionDate),
      rawBars: await dataSource.query(
        'SELECT session_date, stored_at, CAST(stored_at AS CHAR) AS text FROM bar ORDER BY 1',
      ),
      csv: await fileOf(csv, 'closes.csv'),
      xlsx: await fileOf(xlsx, 'closes.xlsx'),
      forecast: makeForecast(steady, usOptionsCalendar),
      fills: [at('2026-11-01', '01:30'), at('2026-03-08', '02:30'), at('2026-12-09', '15:52')],
      seal: sealHash(
        {
          deskId,
          traderId: idOf(1),
          sequence: 1,
          previousHash: '0'.repeat(64),
          sealedAtMicroseconds: BigInt(new Date(instants[1] ?? '').getTime()) * 1000n,
        },
        'a'.repeat(64),
      ),
    };
    process.stdout.write(JSON.stringify({ zone: Temporal.Now.timeZoneId(), result }));
  } finally {
    await dataSource.destroy();
  }
}

void main(process.argv[2] ?? '');
