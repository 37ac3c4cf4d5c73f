import { readPriceFile } from '@/server/prices/reading/read-price-file';
import { type SettledReading } from '@/server/prices/reading/interpret-table';
import { type Reading } from '@/shared/prices/price-upload';

const now = '2026-12-09T22:00:00.000Z';

const read = (
  content: string | Uint8Array,
  {
    fileName = 'prices.csv',
    wanted = null,
    shown = null,
  }: { fileName?: string; wanted?: Reading | null; shown?: SettledReading | null } = {},
) =>
  readPriceFile({ bytes: typeof content === 'string' ? Buffer.from(content) : content, fileName, wanted, shown, now });

const closesOf = async (content: string | Uint8Array) =>
  (await read(content)).bars.map(({ sessionDate, close }) => [sessionDate, close]);
const refusalsOf = async (content: string) => (await read(content)).refused.map(({ message }) => message);
const rejection = async (content: string | Uint8Array, fileName = 'prices.csv'): Promise<string> => {
  const error = await read(content, { fileName }).then(
    () => null,
    (reason: unknown) => reason,
  );
  return error instanceof Error ? error.message : 'was read';
};
const utf16 = (text: string, order: 'le' | 'be'): Buffer => {
  const bytes = Buffer.from(`\ufeff${text}`, 'utf16le');
  return order === 'le' ? bytes : bytes.swap16();
};

const twoBars = [
  ['2026-01-05', '101.5'],
  ['2026-01-06', '102.25'],
];

describe('the form of a text file', () => {
  it.each([
    ['comma', 'date,close\n2026-01-05,101.50\n2026-01-06,102.25\n'],
    ['semicolon with decimal comma', 'Datum;Schlusskurs\n05.01.2026;101,50\n06.01.2026;102,25\n'],
    ['tab', 'Date\tClose\n2026/01/05\t101.5\n2026/01/06\t102.25\n'],
    ['bar', 'Séance|Clôture\n05 janv. 2026|101,5\n06 janv. 2026|102,25\n'],
    ['quoted values', '"Date","Close"\r\n"2026-01-05","101.50"\r\n"2026-01-06","102.25"\r\n'],
    ['carriage returns alone', 'date,close\r20260105,101.5\r20260106,102.25\r'],
    ['mixed line ends and blank lines', 'date,close\r\n\r\n2026-01-05,101.5\n\r2026-01-06,102.25'],
    ['a byte order mark', '\ufeffdate,close\n2026-01-05,101.5\n2026-01-06,102.25\n'],
    ['lines above the header', 'Prices of JQVO\nmade by hand\n\nclose,date\n101.5,2026-01-05\n102.25,2026-01-06\n'],
    ['months in words', 'Trade date,Last price\n5-Jan-2026,101.5\n"Jan 6, 2026",102.25\n'],
    ['midnight behind the date', 'Date,Close\n2026-01-05 00:00:00,101.5\n2026-01-06T00:00:00-05:00,102.25\n'],
    ['trailing delimiters', 'date,close\n2026-01-05,101.5,\n2026-01-06,102.25,,\n'],
  ])('reads %s', async (_name, content) => {
    expect(await closesOf(content)).toEqual(twoBars);
  });

  it.each(['le', 'be'] as const)('reads UTF-16 %s by its mark', async (order) => {
    expect(await closesOf(utf16('date;close\n2026-01-05;101,5\n2026-01-06;102,25\n', order))).toEqual(twoBars);
  });

  it('reads header words in Windows-1252 and keeps them as they were', async () => {
    const file = await read(
      Buffer.from('Datum;Er\u00f6ffnung;H\u00f6chst;Tief;Schluss\n05.01.2026;1,1;1,4;1,05;1,2\n', 'latin1'),
    );
    expect(file.headers.map(({ text }) => text)).toEqual(['Datum', 'Eröffnung', 'Höchst', 'Tief', 'Schluss']);
    expect(file.bars).toEqual([
      { row: 2, sessionDate: '2026-01-05', open: '1.1', high: '1.4', low: '1.05', close: '1.2' },
    ]);
  });

  it('takes columns in any order and leaves others out, a header named __proto__ too', async () => {
    const file = await read('__proto__,Close,constructor,Low,High,Open,Date\nx,10,y,9,11,9.5,2026-01-05\n');
    expect(file.reading.columns).toEqual(['ignore', 'close', 'ignore', 'low', 'high', 'open', 'date']);
    expect(file.bars).toEqual([{ row: 2, sessionDate: '2026-01-05', open: '9.5', high: '11', low: '9', close: '10' }]);
    expect(Object.getPrototypeOf({})).toBe(Object.prototype);
  });

  it('prefers the close to the last price, the settlement and the adjusted close', async () => {
    const file = await read('Date,Adj Close,Settlement,Last,Close\n2026-01-05,1,2,3,4\n');
    expect(file.bars.map(({ close }) => close)).toEqual(['4']);
  });

  it('takes an adjusted close only when it stands alone, and then without the raw range', async () => {
    const file = await read('Date,High,Low,Adj Close\n2026-01-05,110,100,50\n');
    expect(file.bars).toEqual([{ row: 2, sessionDate: '2026-01-05', open: null, high: null, low: null, close: '50' }]);
  });

  it('names the line a row starts on when a value above it runs over several lines', async () => {
    expect(await refusalsOf('date,close,note\n2026-01-05,101,"two\nlines"\n2026-01-06,x,\n')).toEqual([
      'Row 4: the close x holds a letter; a price is a plain number. Fix the file or leave the row out.',
    ]);
  });
});

describe('a file that is refused as a whole', () => {
  it.each([
    ['nothing', '', /file is empty/],
    ['blank space', ' \n\n', /file is empty/],
    ['a header alone', 'date,close\n', /Row 1 is a header and nothing stands below/],
    ['no header', '2026-01-05,101\n2026-01-06,102\n', /No header was found in the first 20 rows.*date, close/],
    [
      'a quote mark that never closes',
      'date,close\n2026-01-05,101\n"2026-01-06,102\n2026-01-07,103\n',
      /Row 3: a quote mark opens and is never closed/,
    ],
    ['a quote mark inside a value', 'date,close\n2026-01-05,10"1\n', /Row 2: a quote mark stands inside a value/],
    ['a web page', '<!DOCTYPE html><table><tr><td>date</td></tr></table>', /is a web page/],
    [
      'a line of 70,000 characters',
      `date,close\n${'1'.repeat(70_000)},2\n`,
      /Row 2: the line is longer than 65536 characters/,
    ],
    ['101 columns', `date,close${',x'.repeat(99)}\n2026-01-05,1\n`, /101 columns; at most 100/],
  ])('says what to do about %s', async (_name, content, message) => {
    expect(await rejection(content)).toMatch(message);
  });

  it('refuses binary content whatever its name', async () => {
    const bytes = Buffer.from([0x4d, 0x5a, 0x90, 0, 3, 0, 0, 0]);
    expect(await rejection(bytes)).toMatch(/file is binary/);
    expect(await rejection(bytes, 'prices.xlsx')).toMatch(/file is binary/);
  });

  it('refuses bytes that are text in no encoding it reads', async () => {
    expect(await rejection(Buffer.from([0x64, 0x2c, 0x81, 0xff, 0x0a]))).toMatch(/encoding UTF-8/);
  });

  it('refuses a name that contradicts the content, and kinds it does not know', async () => {
    expect(await rejection('date,close\n2026-01-05,1\n', 'prices.xlsx')).toMatch(/is no workbook/);
    expect(await rejection('date,close\n2026-01-05,1\n', 'prices.exe')).toMatch(/"\.exe" are not read/);
    expect(await rejection(Buffer.from('PK\u0003\u0004rest'), 'prices.csv')).toMatch(/packed file/);
    expect(await rejection(Buffer.from('d0cf11e0a1b11ae1', 'hex'), 'prices.xlsx')).toMatch(/without a password/);
  });

  it('refuses more than 100,000 rows and names the limit', async () => {
    expect(await rejection(`date,close\n${'2026-01-05,1\n'.repeat(101_500)}`)).toMatch(/at most 100000 rows/);
  });
});

describe('a row that cannot be taken', () => {
  const row = (date: string, close: string) => `date,close\n2026-01-05,101\n${date},${close}\n`;
  it.each([
    ['2026-02-30', '5', 'the date 2026-02-30 does not exist'],
    ['31/02/2026', '5', 'the date 31/02/2026 does not exist'],
    ['2026-01-10', '5', 'the date 2026-01-10 is no session: the exchange was closed (weekend)'],
    ['2026-12-10', '5', 'the date 2026-12-10 lies in the future'],
    ['1989-12-29', '5', 'the date 1989-12-29 is before 1990-01-01'],
    ['2026-01-05', '5', 'the date 2026-01-05 stands in row 2 already'],
    ['05/01/26', '5', 'the date 05/01/26 has a year of two digits. Write four'],
    ['2026-01-06 15:59', '5', 'the date 2026-01-06 15:59 has a time of day. A daily bar has a date alone'],
    ['soon', '5', 'the date soon is not a date'],
    ['', '5', 'the date is missing'],
    ['2026-01-06', '', 'the close is missing'],
    ['2026-01-06', '-5', 'the close -5 is below 0; a price is above 0'],
    ['2026-01-06', '\u22125', 'the close \u22125 is below 0; a price is above 0'],
    ['2026-01-06', '(5.00)', 'the close (5.00) is below 0; a price is above 0'],
    ['2026-01-06', '0.00', 'the close 0.00 is 0; a price is above 0'],
    ['2026-01-06', '12a.5', 'the close 12a.5 holds a letter; a price is a plain number'],
    ['2026-01-06', '1e3', 'the close 1e3 holds a letter; a price is a plain number'],
    ['2026-01-06', '0x10', 'the close 0x10 holds a letter; a price is a plain number'],
    ['2026-01-06', 'NaN', 'the close NaN holds a letter; a price is a plain number'],
    ['2026-01-06', '5%', 'the close 5% carries a percent sign; a price is a plain number'],
    ['2026-01-06', '\uff11\uff12', 'the close \uff11\uff12 is not a plain number'],
    ['2026-01-06', '"12,34,567"', 'the close 12,34,567 is not a plain number'],
    [
      '2026-01-06',
      '1.1234567890123',
      'the close 1.1234567890123 has 13 decimals; at most 12 are kept, so round the column',
    ],
  ])('names %s with %s', async (date, close, problem) => {
    expect(await refusalsOf(row(date, close))).toEqual([`Row 3: ${problem}. Fix the file or leave the row out.`]);
  });

  it('names the holiday', async () => {
    expect(await refusalsOf(row('2026-01-19', '5'))).toEqual([
      expect.stringMatching(/^Row 3: the date 2026-01-19 is no session: .*King/),
    ]);
  });

  it('names a session that has not closed yet', async () => {
    const content = Buffer.from('date,close\n2026-12-09,5\n');
    const request = { bytes: content, fileName: 'a.csv', wanted: null, shown: null };
    const before = await readPriceFile({ ...request, now: '2026-12-09T20:59:59.999Z' });
    expect(before.refused[0]?.message).toMatch(/Row 2: the date 2026-12-09 is of a session that has not closed yet/);
    const after = await readPriceFile({ ...request, now: '2026-12-09T21:00:00.000Z' });
    expect(after.bars).toHaveLength(1);
  });

  it.each([
    ['10,9,11,10', 'the high 9 is below the low 11'],
    ['10,11,9,12', 'the close 12 is above the high 11'],
    ['10,11,9,8', 'the close 8 is below the low 9'],
    ['12,11,9,10', 'the open 12 is above the high 11'],
  ])('names the prices %s that cannot be of one session', async (prices, problem) => {
    expect(await refusalsOf(`date,open,high,low,close\n2026-01-05,${prices}\n`)).toEqual([
      `Row 2: ${problem}. Fix the file or leave the row out.`,
    ]);
  });

  it('names a row with more columns than the header', async () => {
    expect(await refusalsOf('date,close\n2026-01-05,4,512.30\n')).toEqual([
      'Row 2: the row has 3 columns where the header has 2. Fix the file or leave the row out.',
    ]);
  });
});

describe('numbers', () => {
  it.each([
    ['point', '"4,512.30"', '4512.3'],
    ['point', '4 512.30', '4512.3'],
    ['point', '"1,234,567.5"', '1234567.5'],
    ['point', '0.000000000001', '0.000000000001'],
    ['point', '007.50', '7.5'],
    ['comma', '4.512,30', '4512.3'],
    ['comma', '4\u00a0512,30', '4512.3'],
    ['comma', "4'512,30", '4512.3'],
  ])('reads with decimal %s the price %s exactly', async (mark, text, price) => {
    const file = await read(mark === 'point' ? `date,close\n2026-01-05,${text}\n` : `date;close\n2026-01-05;${text}\n`);
    expect(file.reading.decimalMark).toBe(mark);
    expect(file.bars.map(({ close }) => close)).toEqual([price]);
  });

  it('asks what the mark means when every price could be read both ways, and reads as answered', async () => {
    const content = 'date;close\n2026-01-05;4.512\n2026-01-06;4.530\n';
    const asked = await read(content);
    expect(asked.questions.map(({ about }) => about)).toEqual(['decimalMark']);
    expect(asked.questions[0]?.choices.map(({ value, example }) => [value, example])).toEqual([
      ['point', '4.512'],
      ['comma', '4512'],
    ]);
    const answered = await read(content, { wanted: { ...asked.reading, decimalMark: 'comma' }, shown: asked });
    expect(answered.questions).toEqual([]);
    expect(answered.bars.map(({ close }) => close)).toEqual(['4512', '4530']);
    const confirmed = await read(content, { wanted: asked.reading, shown: asked });
    expect(confirmed.questions).toEqual([]);
    expect(confirmed.bars.map(({ close }) => close)).toEqual(['4.512', '4.53']);
  });
});

describe('dates', () => {
  it.each([
    ['13/01/2026', 'day-month-year', '2026-01-13'],
    ['01/13/2026', 'month-day-year', '2026-01-13'],
    ['5.1.2026', 'day-month-year', '2026-01-05'],
  ])('finds the order that %s allows', async (date, order, sessionDate) => {
    const file = await read(`date,close\n${date},5\n`);
    expect([file.reading.dateOrder, file.bars[0]?.sessionDate]).toEqual([order, sessionDate]);
  });

  it('asks when every row allows both orders, reads nothing until then, and reads as answered', async () => {
    const content = 'date,close\n02/03/2026,5\n03/03/2026,6\n';
    const asked = await read(content);
    expect(asked.reading.dateOrder).toBeNull();
    expect(asked.bars).toEqual([]);
    expect(asked.questions).toEqual([
      expect.objectContaining({ about: 'dateOrder', question: expect.stringContaining('02/03/2026') }),
    ]);
    const dates = async (dateOrder: 'day-month-year' | 'month-day-year') =>
      (await read(content, { wanted: { ...asked.reading, dateOrder }, shown: asked })).bars.map(
        ({ sessionDate }) => sessionDate,
      );
    expect(await dates('day-month-year')).toEqual(['2026-03-02', '2026-03-03']);
    expect(await dates('month-day-year')).toEqual(['2026-02-03', '2026-03-03']);
  });

  it('keeps asking about the mark when only the order was answered', async () => {
    const content = 'date;close\n02/03/2026;4.512\n';
    const asked = await read(content);
    expect(asked.questions.map(({ about }) => about)).toEqual(['dateOrder', 'decimalMark']);
    const next = await read(content, { wanted: { ...asked.reading, dateOrder: 'day-month-year' }, shown: asked });
    expect(next.questions.map(({ about }) => about)).toEqual(['decimalMark']);
    const last = await read(content, { wanted: next.reading, shown: next });
    expect([last.questions, last.bars.length]).toEqual([[], 1]);
  });
});

describe('columns', () => {
  it('asks for a column that no header word names, and reads as answered', async () => {
    const content = 'Fecha,Cierre\n2026-01-05,5\n';
    const asked = await read(content);
    expect(asked.questions.map(({ question }) => question)).toEqual([
      'Which column holds the date?',
      'Which column holds the closing price?',
    ]);
    expect(asked.questions[1]?.choices).toEqual([
      { value: 'close:0', label: 'Fecha', example: '2026-01-05' },
      { value: 'close:1', label: 'Cierre', example: '5' },
    ]);
    const answered = await read(content, { wanted: { ...asked.reading, columns: ['date', 'close'] }, shown: asked });
    expect([answered.questions, answered.bars.length]).toEqual([[], 1]);
  });

  it('asks which of two closes is meant', async () => {
    const asked = await read('date,close,close\n2026-01-05,5,6\n');
    expect(asked.questions.map(({ about }) => about)).toEqual(['columns']);
  });

  it('finds the columns again when another header row is chosen', async () => {
    const content = 'date,close\nclose,date\n5,2026-01-05\n';
    const first = await read(content);
    const second = await read(content, { wanted: { ...first.reading, headerRow: 2 }, shown: first });
    expect(second.reading.columns).toEqual(['close', 'date']);
    expect(second.bars.map(({ sessionDate }) => sessionDate)).toEqual(['2026-01-05']);
  });
});
