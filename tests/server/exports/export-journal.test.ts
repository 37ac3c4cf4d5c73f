import { parse } from 'csv-parse/sync';
import Excel from 'exceljs';
import { addDraft, addSealed, addUnderlying, completePlan, fill, option } from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

/** What a spreadsheet would take for a formula, in many dresses. */
const starts = ['=', '+', '-', '@', '\t', '\r', '\n', '\uFF1D', '\uFF0B', '\uFF0D', '\uFF20'];
const bodies = [
  '1+1',
  'cmd|x!A0',
  'SUM(A1:A9)',
  '"a"',
  ' 2',
  'HYPERLINK(1)',
  '-1',
  '=1',
  '@x',
  'A1',
  ';1',
  ',1',
  '"",1',
  '\u202E1',
  '1e3',
  '#REF!',
  '{1}',
  '%1',
  '$A$1',
];
const payloads = starts.flatMap((start) => bodies.map((body) => `${start}${body}`)).slice(0, 200);

let app: TestApp;
let trader: TestPerson;
let entryId: string;
let underlyingId: string;

beforeAll(async () => {
  app = await startTestApp();
  trader = await app.person({ role: 'trader' });
  underlyingId = await addUnderlying(trader);
  entryId = await addSealed(
    trader,
    completePlan(underlyingId, { tags: ['calm', 'weekly'], idea: 'A range, "third" test; two\nlines' }),
  );
  const bought = fill('buy', option('put', '95'), {
    price: '0.30',
    fees: '0.66',
    tradedAt: '2026-12-10T15:00:00.000Z',
  });
  const sold = fill('sell', option('put', '97'), { price: '0.78', fees: '0.66', tradedAt: '2026-12-10T15:00:01.000Z' });
  for (const one of [bought, sold]) await trader.post(`/entries/${entryId}/fills`).send(one).expect(201);
});
afterAll(() => app.stop());

const asText = async (query: string, person = trader) =>
  (await person.get(`/exports/journal?${query}`).expect(200)).text;
const csvOf = async (query: string, person = trader): Promise<Record<string, string>[]> =>
  parse(await asText(`format=csv&${query}`, person), { bom: true, columns: true });

async function workbookOf(query = ''): Promise<Excel.Workbook> {
  const answer = await trader
    .get(`/exports/journal?format=xlsx${query}`)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    })
    .expect(200);
  const workbook = new Excel.Workbook();
  await workbook.xlsx.load(answer.body);
  return workbook;
}

describe('the journal as CSV', () => {
  it('is a file with a name, whose rows say what the screens say', async () => {
    const answer = await trader.get('/exports/journal?format=csv').expect(200);
    expect(answer.headers['content-disposition']).toBe('attachment; filename="journal-2026-12-09-entries.csv"');
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    const [row] = await csvOf('table=entries&state=open');
    expect(row).toMatchObject({
      Entry: entryId,
      Underlying: 'HVYQ',
      Structure: 'bull put 97 / 95',
      State: 'open',
      Tags: 'calm, weekly',
      Sealed: '2026-12-09T22:00:00.000Z',
      'Sealed late': 'no',
      Idea: 'A range, "third" test; two\nlines',
      Currency: 'USD',
    });
  });

  it('has fills with their cash, to the last digit', async () => {
    const rows = await csvOf('table=fills&state=open');
    expect(rows.map(({ Kind, Type, Strike, Cash }) => [Kind, Type, Strike, Cash])).toEqual([
      ['buy', 'put', '95', '-30.66'],
      ['sell', 'put', '97', '77.34'],
    ]);
  });

  it('has every stated probability, and the forecast it belongs to', async () => {
    const { body } = await trader.get(`/entries/${entryId}`).expect(200);
    const odds = await csvOf('table=odds&state=open');
    expect(new Set(odds.map(({ Odds }) => Number(Odds)))).toEqual(
      new Set(body.sealed.forecast.odds.map(({ probability }: { probability: { base: number } }) => probability.base)),
    );
    const [forecast] = await csvOf('table=forecasts&state=open');
    expect(forecast).toMatchObject({
      Hash: body.sealed.receipt.hash,
      'Volatility, base': String(body.sealed.input.volatility.base),
      'Mean profit, base': String(body.sealed.forecast.atExpiry.mean.base),
    });
  });

  it('holds what fits the filter and nothing of anyone else', async () => {
    expect(await csvOf('tag=nowhere')).toEqual([]);
    const stranger = await app.person({ role: 'trader' });
    expect(await csvOf('table=fills', stranger)).toEqual([]);
    const colleague = await app.person({ role: 'trader', deskOf: trader });
    expect(await csvOf('table=entries', colleague)).toEqual([]);
  });

  it('refuses a format and a table that there are not', async () => {
    await trader.get('/exports/journal?format=pdf').expect(400);
    await trader.get('/exports/journal?format=csv&table=sessions').expect(400);
  });
});

describe('the journal as JSON', () => {
  it('has every table with the meaning of its columns', async () => {
    const { exportedAt, tables } = JSON.parse(await asText('format=json&state=open'));
    expect(exportedAt).toBe('2026-12-09T22:00:00.000Z');
    expect(Object.keys(tables)).toEqual(['entries', 'forecasts', 'odds', 'fills', 'outcomes']);
    const { columns, rows } = tables.fills;
    const cash = columns.findIndex(({ header }: { header: string }) => header === 'Cash');
    expect(rows.map((row: unknown[]) => row[cash])).toEqual(['-30.66', '77.34']);
    expect(columns[cash].meaning).toBe('In (positive) or out, after fees');
  });
});

describe('the journal as a workbook', () => {
  it('has typed cells under a frozen head, and a sheet that says what each column means', async () => {
    const workbook = await workbookOf('&state=open');
    expect(workbook.worksheets.map(({ name }) => name)).toEqual([
      'entries',
      'forecasts',
      'odds',
      'fills',
      'outcomes',
      'columns',
    ]);
    const fills = workbook.getWorksheet('fills');
    expect(fills?.views).toEqual([expect.objectContaining({ state: 'frozen', ySplit: 1 })]);
    const heads = (fills?.getRow(1).values as string[]).slice(1);
    const cell = (header: string) => fills?.getRow(2).getCell(heads.indexOf(header) + 1);
    expect(cell('Cash')?.value).toBe(-30.66);
    expect(cell('Traded')?.value).toEqual(new Date('2026-12-10T15:00:00.000Z'));
    expect(cell('Expiry')?.value).toEqual(new Date('2026-12-18T00:00:00.000Z'));
    expect(cell('Expiry')?.numFmt).toBe('yyyy-mm-dd');
    expect(cell('Kind')?.value).toBe('buy');
    const explained = workbook.getWorksheet('columns')?.getColumn(2).values ?? [];
    for (const head of heads) expect(explained).toContain(head);
  });
});

describe('text that a spreadsheet would compute', () => {
  beforeAll(async () => {
    for (const [index, payload] of payloads.entries())
      if (index % 2 === 0)
        await addDraft(trader, completePlan(underlyingId, { idea: payload, exitRule: payloads[index + 1] ?? '' }));
  });

  it('is shown and not computed, in CSV and in the workbook: 200 dresses', async () => {
    const rows = await csvOf('table=entries&state=draft');
    const texts = rows.flatMap((row) => [row.Idea ?? '', row['Exit rule'] ?? '']);
    expect(texts).toHaveLength(200);
    expect(texts.filter((text) => !text.startsWith("'"))).toEqual([]);
    const workbook = await workbookOf('&state=draft');
    let cells = 0;
    workbook.getWorksheet('entries')?.eachRow((row) =>
      row.eachCell(({ type }) => {
        cells += 1;
        expect(type).not.toBe(Excel.ValueType.Formula);
      }),
    );
    expect(cells).toBeGreaterThan(1000);
  });
});
