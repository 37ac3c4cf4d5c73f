import { randomUUID } from 'node:crypto';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';
import { day, makeWorkbook } from '@/tests/server/prices/make-workbook';
import { type PriceUpload } from '@/shared/prices/price-upload';
import { priceFileLimits } from '@/shared/prices/price-upload-endpoints';

const now = '2026-12-09T22:00:00.000Z';
const fields = {
  symbol: 'JQVO',
  name: 'Invented index',
  style: 'european',
  settlement: 'cash',
  settlementTime: 'pm',
  multiplier: '100',
  dividendYield: 0.01,
  currency: 'USD',
};

jest.setTimeout(60_000); // threads start slowly on a busy machine

let app: TestApp;
let trader: TestPerson;
let underlyingId: string;

beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]); // no statement on a desk's table went without the desk
});
beforeEach(async () => {
  app.clock.set(now);
  trader = await app.person({ role: 'trader' });
  underlyingId = randomUUID();
  await trader
    .post('/underlyings')
    .send({ id: underlyingId, ...fields })
    .expect(201);
});

const upload = (content: string | Buffer, fileName = 'prices.csv', person = trader) =>
  person.post(`/underlyings/${underlyingId}/price-uploads`).attach('file', Buffer.from(content), fileName);
const preview = async (content: string | Buffer, fileName = 'prices.csv'): Promise<PriceUpload> =>
  (await upload(content, fileName).expect(201)).body;
const commit = (uploadId: string, person = trader) => person.post(`/price-uploads/${uploadId}/commit`);
const bars = async (): Promise<[string, string][]> =>
  (await trader.get(`/underlyings/${underlyingId}`).expect(200)).body.bars.map(
    (bar: { sessionDate: string; close: string }) => [bar.sessionDate, bar.close],
  );

const twoBars = 'date,close\n2026-01-05,101.50\n2026-01-06,102.25\n';

describe('an upload of prices', () => {
  it('shows what it would store, stores it once it is told to, and shows it in the end', async () => {
    const shown = await preview(twoBars);
    expect(shown).toMatchObject({
      underlyingId,
      fileName: 'prices.csv',
      state: 'preview',
      rowsRead: 2,
      added: 2,
      unchanged: 0,
      changes: [],
      refused: [],
      firstSessionDate: '2026-01-05',
      lastSessionDate: '2026-01-06',
      canCommit: true,
    });
    expect(await bars()).toEqual([]);
    const stored = await commit(shown.id).expect(200);
    expect(stored.body).toMatchObject({ state: 'committed', added: 2, canCommit: false });
    expect(await bars()).toEqual([
      ['2026-01-05', '101.5'],
      ['2026-01-06', '102.25'],
    ]);
    expect((await trader.get(`/price-uploads/${shown.id}`).expect(200)).body).toEqual(stored.body);
  });

  it('reads the same bars from a workbook', async () => {
    const workbook = await makeWorkbook({
      Prices: (sheet) =>
        void sheet.addRows([
          ['Close', 'Date'],
          [101.5, day('2026-01-05')],
          [102.25, day('2026-01-06')],
        ]),
    });
    const shown = await preview(workbook, 'prices.xlsx');
    await commit(shown.id).expect(200);
    expect(await bars()).toEqual([
      ['2026-01-05', '101.5'],
      ['2026-01-06', '102.25'],
    ]);
  });

  it('changes nothing when the same file comes again', async () => {
    await commit((await preview(twoBars)).id).expect(200);
    const before = (await trader.get(`/underlyings/${underlyingId}`)).body;
    app.clock.set('2026-12-09T22:05:00.000Z');
    const again = await preview(twoBars);
    expect(again).toMatchObject({ added: 0, unchanged: 2, changes: [] });
    await commit(again.id).expect(200);
    expect((await trader.get(`/underlyings/${underlyingId}`)).body.bars).toEqual(before.bars);
  });

  it('shows a changed close before it stores it', async () => {
    await commit((await preview(twoBars)).id).expect(200);
    const shown = await preview('date,close\n2026-01-06,103\n2026-01-07,104\n');
    expect(shown).toMatchObject({
      added: 1,
      unchanged: 0,
      changes: [{ row: 2, sessionDate: '2026-01-06', from: '102.25', to: '103' }],
    });
    await commit(shown.id).expect(200);
    expect(await bars()).toEqual([
      ['2026-01-05', '101.5'],
      ['2026-01-06', '103'],
      ['2026-01-07', '104'],
    ]);
  });

  it('stores nothing of a file with one bad row, and says which', async () => {
    const shown = await preview('date,close\n2026-01-05,101\n2026-01-06,1o2\n2026-01-07,103\n');
    expect(shown).toMatchObject({
      canCommit: false,
      refused: [
        {
          row: 3,
          column: 'close',
          message: 'Row 3: the close 1o2 holds a letter; a price is a plain number. Fix the file or leave the row out.',
        },
      ],
    });
    const refused = await commit(shown.id).expect(409);
    expect(refused.body.error).toMatchObject({ code: 'step-out-of-order', problems: [{ field: 'rows.3' }] });
    expect(await bars()).toEqual([]);
  });

  it('stores nothing while a question is open, and stores as answered', async () => {
    const shown = await preview('date,close\n02/03/2026,101\n03/03/2026,102\n');
    expect(shown.questions.map(({ about }) => about)).toEqual(['dateOrder']);
    await commit(shown.id).expect(409);
    const answered = await trader
      .put(`/price-uploads/${shown.id}/reading`)
      .send({ ...shown.reading, dateOrder: 'day-month-year' })
      .expect(200);
    expect(answered.body).toMatchObject({ questions: [], canCommit: true, added: 2 });
    await commit(shown.id).expect(200);
    expect((await bars()).map(([date]) => date)).toEqual(['2026-03-02', '2026-03-03']);
  });

  it('keeps asking when a file with an open question is stored without an answer', async () => {
    const shown = await preview('date;close\n2026-01-05;4.512\n');
    expect(shown.questions.map(({ about }) => about)).toEqual(['decimalMark']);
    await commit(shown.id).expect(409);
    await commit(shown.id).expect(409);
    expect(await bars()).toEqual([]);
  });

  it('refuses a reading that marks two columns alike, and keeps the one before', async () => {
    const shown = await preview('date,close,last\n2026-01-05,101,102\n');
    const refused = await trader
      .put(`/price-uploads/${shown.id}/reading`)
      .send({ ...shown.reading, columns: ['date', 'close', 'close'] })
      .expect(400);
    expect(refused.body.error.problems).toEqual([
      { field: 'columns', message: 'Two columns are marked as close. Choose one of them.' },
    ]);
    await commit(shown.id).expect(200);
    expect(await bars()).toEqual([['2026-01-05', '101']]);
  });

  it('shows the changes again instead of storing them when the bars moved since the preview', async () => {
    await commit((await preview(twoBars)).id).expect(200);
    const shown = await preview('date,close\n2026-01-06,103\n');
    await trader
      .put(`/underlyings/${underlyingId}/bars/2026-01-06`)
      .send({ close: '102.5', open: null, high: null, low: null, settlement: null })
      .expect(200);
    const moved = await commit(shown.id).expect(409);
    expect(moved.body.error.code).toBe('changed-elsewhere');
    expect(moved.body.error.current.changes).toEqual([{ row: 2, sessionDate: '2026-01-06', from: '102.5', to: '103' }]);
    expect((await bars()).at(-1)).toEqual(['2026-01-06', '102.5']);
    await commit(shown.id).expect(200);
    expect((await bars()).at(-1)).toEqual(['2026-01-06', '103']);
  });

  it('stores each session once when the same file is stored many times at once', async () => {
    const uploads = [];
    for (let count = 0; count < 6; count += 1) uploads.push(await preview(twoBars));
    const answers = await Promise.all(uploads.map(({ id }) => commit(id)));
    expect(answers.map(({ status }) => status)).toEqual(uploads.map(() => 200));
    expect(await bars()).toHaveLength(2);
    expect(answers.filter(({ body }) => body.added === 2)).toHaveLength(1);
  });

  it('answers a repeated commit with what was stored', async () => {
    const shown = await preview(twoBars);
    const [first, second] = await Promise.all([commit(shown.id), commit(shown.id)]);
    expect([first?.status, second?.status]).toEqual([200, 200]);
    expect(second?.body).toEqual(first?.body);
  });

  it('lets go of the file after a day', async () => {
    const shown = await preview(twoBars);
    // A session ends when it is left alone for long, so the trader looks in now and then.
    for (const instant of ['2026-12-10T04:00:00.000Z', '2026-12-10T10:00:00.000Z', '2026-12-10T16:00:00.000Z']) {
      app.clock.set(instant);
      await trader.get(`/price-uploads/${shown.id}`).expect(200);
    }
    app.clock.set('2026-12-10T22:00:00.001Z');
    const late = await commit(shown.id).expect(410);
    expect(late.body.error.code).toBe('upload-expired');
    expect(await bars()).toEqual([]);
  });

  it('points out a close that is far from the others', async () => {
    const dates = [
      '05',
      '06',
      '07',
      '08',
      '09',
      '12',
      '13',
      '14',
      '15',
      '16',
      '20',
      '21',
      '22',
      '23',
      '26',
      '27',
      '28',
      '29',
      '30',
    ];
    const january = dates.map((date, index) => `2026-01-${date},${100 + ((index * index) % 7)}`);
    const february = ['02', '03', '04', '05', '06'].map(
      (date, index) => `2026-02-${date},${index === 2 ? 1010 : 100 + ((index * index) % 7)}`,
    );
    const shown = await preview(`date,close\n${[...january, ...february].join('\n')}\n`);
    expect(shown.suspects.map(({ sessionDate }) => sessionDate)).toEqual(['2026-02-04', '2026-02-05']);
    expect(shown.canCommit).toBe(true);
  });
});

describe('a file that cannot be read', () => {
  it.each([
    ['empty', Buffer.alloc(0), 'prices.csv', /file is empty/],
    ['binary', Buffer.from([1, 0, 2, 0, 255, 254, 0]), 'prices.csv', /is binary/],
    ['a header alone', Buffer.from('date,close\n'), 'prices.csv', /nothing stands below/],
  ])('is refused when %s, saying what to do', async (_name, content, fileName, message) => {
    const refused = await upload(content, fileName).expect(422);
    expect(refused.body.error).toMatchObject({ code: 'file-unreadable', message: expect.stringMatching(message) });
    expect(refused.body.error.action).not.toBe('');
  });

  it('is refused when it is half a workbook', async () => {
    const workbook = await makeWorkbook({
      Prices: (sheet) =>
        void sheet.addRows([
          ['Date', 'Close'],
          [day('2026-01-05'), 1],
        ]),
    });
    const refused = await upload(workbook.subarray(0, workbook.length / 2), 'prices.xlsx').expect(422);
    expect(refused.body.error.message).toMatch(/damaged or incomplete/);
  });

  it('is refused with the limit named when it is one byte too large', async () => {
    const refused = await upload(Buffer.alloc(priceFileLimits.bytes + 1, 0x20)).expect(413);
    expect(refused.body.error).toMatchObject({ code: 'too-large', message: expect.stringContaining('20 MB') });
  });

  it('is refused for its content when it is just as large as may be', async () => {
    await upload(Buffer.alloc(priceFileLimits.bytes, 0x20)).expect(422);
  });

  it('is kept whole until it is stored, up to the greatest size', async () => {
    const note = 'x'.repeat(65_000);
    const filled = Array.from({ length: 320 }, () => `,,${note}`);
    const shown = await preview(`date,close,note\n2026-01-05,101,\n${filled.join('\n')}\n`);
    expect(shown).toMatchObject({ canCommit: false, rowsRead: 321 });
    const again = await trader.put(`/price-uploads/${shown.id}/reading`).send(shown.reading).expect(200);
    expect(again.body.rowsRead).toBe(321);
  });

  it('is refused when no file or two are sent', async () => {
    await trader.post(`/underlyings/${underlyingId}/price-uploads`).field('note', 'x').expect(400);
    await upload(twoBars).attach('other', Buffer.from(twoBars), 'b.csv').expect(400);
  });
});

describe('who may upload', () => {
  it('is nobody without a session', async () => {
    await app.anonymous
      .post(`/underlyings/${underlyingId}/price-uploads`)
      .attach('file', Buffer.from(twoBars), 'a.csv')
      .expect(401);
  });

  it('is nobody outside the desk, and nobody else sees the upload', async () => {
    const shown = await preview(twoBars);
    const stranger = await app.person({ role: 'trader' });
    await upload(twoBars, 'prices.csv', stranger).expect(404);
    await stranger.get(`/price-uploads/${shown.id}`).expect(404);
    await stranger.put(`/price-uploads/${shown.id}/reading`).send(shown.reading).expect(404);
    await commit(shown.id, stranger).expect(404);
    expect(await bars()).toEqual([]);
  });

  it('is not a mentor, and not someone who is not signed in', async () => {
    const shown = await preview(twoBars);
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    await upload(twoBars, 'prices.csv', mentor).expect(403);
    await commit(shown.id, mentor).expect(403);
    expect(await bars()).toEqual([]);
  });

  it('is another trader of the desk only with a file of their own', async () => {
    const shown = await preview(twoBars);
    const colleague = await app.person({ role: 'trader', deskOf: trader });
    await colleague.get(`/price-uploads/${shown.id}`).expect(404);
    const own = (await upload(twoBars, 'prices.csv', colleague).expect(201)).body;
    await commit(own.id, colleague).expect(200);
    expect(await bars()).toHaveLength(2);
  });
});
