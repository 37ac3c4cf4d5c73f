import { type Worksheet } from 'exceljs';
import { readPriceFile } from '@/server/prices/reading/read-price-file';
import { type SettledReading } from '@/server/prices/reading/interpret-table';
import { type Reading } from '@/shared/prices/price-upload';
import { makeZip, partsOf, type ZipPart } from '@/tests/server/prices/make-zip';
import { day, makeWorkbook } from '@/tests/server/prices/make-workbook';

const now = '2026-12-09T22:00:00.000Z';
const read = (
  bytes: Buffer,
  { wanted = null, shown = null }: { wanted?: Reading | null; shown?: SettledReading | null } = {},
) => readPriceFile({ bytes, fileName: 'prices.xlsx', wanted, shown, now });
const rejection = (bytes: Buffer): Promise<string> =>
  read(bytes).then(
    () => 'was read',
    (error: unknown) => (error instanceof Error ? error.message : String(error)),
  );
const plain = () =>
  makeWorkbook({
    Prices: (sheet) =>
      void sheet.addRows([
        ['Date', 'Close'],
        [day('2026-01-05'), 101.5],
      ]),
  });
const changed = async (change: (parts: ZipPart[]) => ZipPart[]): Promise<Buffer> =>
  makeZip(change(await partsOf(await plain())));
const withPart =
  (name: string, content: string) =>
  (parts: ZipPart[]): ZipPart[] => [
    ...parts.filter((part) => part.name !== name),
    { name, content: Buffer.from(content) },
  ];

describe('a workbook', () => {
  it('gives typed dates and prices, without noise of the binary form', async () => {
    const file = await read(
      await makeWorkbook({
        Prices: (sheet) =>
          void sheet.addRows([
            ['Date', 'Open', 'High', 'Low', 'Close'],
            [day('2026-01-05'), 0.1 + 0.2, 1e-7 + 1, 0.25, 0.7 + 0.1],
            ['2026-01-06', 4512, 4600, 4500, '4,512.30'],
          ]),
      }),
    );
    expect(file.refused).toEqual([]);
    expect(file.bars).toEqual([
      { row: 2, sessionDate: '2026-01-05', open: '0.3', high: '1.0000001', low: '0.25', close: '0.8' },
      { row: 3, sessionDate: '2026-01-06', open: '4512', high: '4600', low: '4500', close: '4512.3' },
    ]);
  });

  it('reads the dates of a workbook that counts from 1904', async () => {
    const file = await read(
      await makeWorkbook(
        {
          Prices: (sheet) =>
            void sheet.addRows([
              ['Date', 'Close'],
              [day('2026-01-05'), 5],
            ]),
        },
        (workbook) => {
          workbook.properties.date1904 = true;
        },
      ),
    );
    expect(file.bars.map(({ sessionDate }) => sessionDate)).toEqual(['2026-01-05']);
  });

  it('takes what formulas last gave, and names error cells, empty results and numbers in place of dates', async () => {
    const file = await read(
      await makeWorkbook({
        Prices: (sheet) =>
          void sheet.addRows([
            ['Date', 'Close'],
            [day('2026-01-05'), { formula: 'A1*2', result: 7.25 }],
            [day('2026-01-06'), { error: '#N/A' }],
            [day('2026-01-07'), { formula: 'A1', result: { error: '#REF!' } }],
            [day('2026-01-08'), { formula: 'A1' }],
            [46031, 5],
            [20260112, 5],
            [new Date('2026-01-13T15:59:00Z'), 5],
          ]),
      }),
    );
    expect(file.bars.map(({ sessionDate, close }) => [sessionDate, close])).toEqual([
      ['2026-01-05', '7.25'],
      ['2026-01-12', '5'],
    ]);
    expect(file.refused.map(({ message, column }) => [column, message.split('. ')[0]])).toEqual([
      ['Close', 'Row 3: the close #N/A is an error of the worksheet, not a price'],
      ['Close', 'Row 4: the close #REF! is an error of the worksheet, not a price'],
      ['Close', 'Row 5: the close is missing'],
      ['Date', 'Row 6: the date 46031 is a number, not a date'],
      ['Date', 'Row 8: the date 2026-01-13 15:59:00 has a time of day'],
    ]);
  });

  it('leaves hidden sheets out and asks which of several price sheets to read', async () => {
    const fill = (close: number) => (sheet: Worksheet) =>
      void sheet.addRows([
        ['Date', 'Close'],
        [day('2026-01-05'), close],
      ]);
    const bytes = await makeWorkbook(
      { Notes: (sheet) => void sheet.addRow(['about these prices']), Secret: fill(1), JQVO: fill(2), HVYQ: fill(3) },
      (workbook) => {
        const secret = workbook.getWorksheet('Secret');
        if (secret !== undefined) secret.state = 'hidden';
      },
    );
    const asked = await read(bytes);
    expect(asked.sheets).toEqual(['Notes', 'JQVO', 'HVYQ']);
    expect(asked.questions.map(({ about, choices }) => [about, choices.map(({ value }) => value)])).toEqual([
      ['sheet', ['JQVO', 'HVYQ']],
    ]);
    expect(asked.bars.map(({ close }) => close)).toEqual(['2']);
    const other = await read(bytes, { wanted: { ...asked.reading, sheet: 'HVYQ' }, shown: asked });
    expect([other.questions, other.bars.map(({ close }) => close)]).toEqual([[], ['3']]);
    await expect(read(bytes, { wanted: { ...asked.reading, sheet: 'Secret' }, shown: asked })).rejects.toThrow(
      /no sheet "Secret"/,
    );
  });

  it('refuses a value in the last possible cell instead of filling the space before it', async () => {
    const bytes = await makeWorkbook({
      Prices: (sheet) => {
        sheet.addRows([
          ['Date', 'Close'],
          [day('2026-01-05'), 5],
        ]);
        sheet.getCell('XFD1048576').value = 1;
      },
    });
    expect(await rejection(bytes)).toMatch(/Row 1048576: a value stands in column 16384; at most 100 columns/);
  });
});

describe('a packed file that is no plain workbook', () => {
  it('is refused when half of it is missing, wherever it is cut', async () => {
    const bytes = await plain();
    for (const share of [0.1, 0.5, 0.9, 0.999]) {
      expect(await rejection(bytes.subarray(0, Math.floor(bytes.length * share)))).toMatch(/damaged or incomplete/);
    }
  });

  it('is refused when it is a zip of something else, or empty', async () => {
    expect(await rejection(makeZip([{ name: 'prices.csv', content: Buffer.from('date,close') }]))).toMatch(
      /no workbook/,
    );
    expect(await rejection(makeZip([]))).toMatch(/no workbook/);
  });

  it('is refused when a part of it is broken', async () => {
    expect(await rejection(await changed(withPart('xl/worksheets/sheet1.xml', '<worksheet><sheetData><row')))).toMatch(
      /damaged/,
    );
    expect(await rejection(await changed(withPart('xl/workbook.xml', 'none')))).toMatch(/damaged|no sheet/);
  });

  it('is refused with macros, links to other workbooks, entities, or encryption', async () => {
    expect(await rejection(await changed(withPart('xl/vbaProject.bin', 'x')))).toMatch(/holds macros/);
    expect(await rejection(await changed(withPart('xl/externalLinks/externalLink1.xml', '<x/>')))).toMatch(
      /links to other workbooks/,
    );
    expect(
      await rejection(await changed(withPart('xl/styles.xml', '<!DOCTYPE a [<!ENTITY b "c">]><styleSheet/>'))),
    ).toMatch(/declares entities/);
    expect(
      await rejection(
        await changed((parts) => [
          ...parts,
          { name: 'xl/media/a.bin', content: Buffer.from('x'), claims: { isEncrypted: true } },
        ]),
      ),
    ).toMatch(/encrypted/);
  });
});

describe('a packed file that unpacks to too much', () => {
  const zeros = (megabytes: number) => Buffer.alloc(megabytes * 1024 * 1024, 0x20);

  it('is refused for the ratio of one part', async () => {
    expect(
      await rejection(await changed((parts) => [...parts, { name: 'xl/sharedStrings.xml', content: zeros(2) }])),
    ).toMatch(/more than 100 times its size/);
  });

  it('is refused for the sum of its parts', async () => {
    // Half noise, so that no part is suspicious by its ratio.
    const noise = Buffer.from(Array.from({ length: 1 << 18 }, (_, index) => (index * 7919 * (index % 251)) % 256));
    const part = Buffer.concat([noise, zeros(6)]);
    const bytes = await changed((parts) => [
      ...parts,
      ...Array.from({ length: 9 }, (_, index) => ({ name: `xl/media/${index}.bin`, content: part })),
    ]);
    expect(await rejection(bytes)).toMatch(/unpacks to more than 50 MB/);
  });

  it('is refused when it lies about its size', async () => {
    const lie = { name: 'xl/media/a.bin', content: zeros(1), claims: { inflatedBytes: 10 } };
    expect(await rejection(await changed((parts) => [...parts, lie]))).toMatch(/damaged or incomplete/);
  });

  it('is refused when its parts share their bytes', async () => {
    const noise = Buffer.from(Array.from({ length: 20_000 }, (_, index) => (index * 7919 * (index % 251)) % 256));
    const shared = Array.from({ length: 100 }, (_, index) => ({
      name: `xl/media/${index}.bin`,
      content: noise,
      overlaps: index > 0,
    }));
    expect(await rejection(await changed((parts) => [...parts, ...shared]))).toMatch(/damaged or incomplete/);
  });

  it('is refused for 201 parts', async () => {
    const many = Array.from({ length: 201 }, (_, index) => ({ name: `xl/media/${index}`, content: Buffer.from('x') }));
    expect(await rejection(makeZip(many))).toMatch(/201 parts; at most 200/);
  });
});
