import { readInThread, readPriceFileFenced, fenceLimits } from '@/server/prices/fenced-price-file';
import { day, makeWorkbook } from '@/tests/server/prices/make-workbook';

jest.setTimeout(60_000); // threads start slowly on a busy machine

const request = { fileName: 'prices.xlsx', wanted: null, shown: null, now: '2026-12-09T22:00:00.000Z' };
const rows = (count: number): Promise<Buffer> =>
  makeWorkbook({
    Prices: (sheet) => {
      sheet.addRow(['Date', 'Close']);
      for (let index = 0; index < count; index += 1) sheet.addRow([day('2026-01-05'), 100 + index]);
    },
  });

describe('reading a file behind the fence', () => {
  it('gives what the thread read', async () => {
    const file = await readPriceFileFenced({ ...request, bytes: await rows(1) });
    expect(file.bars).toEqual([{ row: 2, sessionDate: '2026-01-05', open: null, high: null, low: null, close: '100' }]);
  });

  it('passes on why a file was refused', async () => {
    await expect(readPriceFileFenced({ ...request, bytes: (await rows(1)).subarray(0, 800) })).rejects.toMatchObject({
      code: 'file-unreadable',
      message: expect.stringMatching(/damaged or incomplete/),
    });
  });

  it('refuses a file that needs more memory than the fence gives, and goes on', async () => {
    const bytes = await rows(40_000);
    const tight = { ...fenceLimits, heapMegabytes: 32, youngHeapMegabytes: 4 };
    await expect(readInThread({ ...request, bytes }, tight)).rejects.toMatchObject({
      code: 'too-large',
      message: 'Reading the file takes more than 32 MB of memory. Save the prices alone as CSV.',
    });
    await expect(readInThread({ ...request, bytes: await rows(1) })).resolves.toMatchObject({ rowsRead: 1 });
  });

  it('refuses a file that takes longer than the fence allows', async () => {
    await expect(
      readInThread({ ...request, bytes: await rows(1) }, { ...fenceLimits, timeMs: 1 }),
    ).rejects.toMatchObject({
      code: 'too-large',
      message: expect.stringMatching(/takes more than 0.001 seconds/),
    });
  });
});
