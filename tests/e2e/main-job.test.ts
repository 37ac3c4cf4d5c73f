import { readFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { type AddressInfo } from 'node:net';
import path from 'node:path';
import jstat from 'jstat';
import { type Browser, type Locator, type Page } from 'playwright-core';
import { engineVersion } from '@/journal/forecast/engine-version';
import { underlyingEndpoints } from '@/shared/underlyings/underlying-endpoints';
import { accessibilityViolations, launchBrowser, openPage, sizes, type WatchedPage } from '@/tests/e2e/support/browser';
import { csvOf, publishedCloses, sessionDatesAfter, sessionDatesEnding } from '@/tests/e2e/support/index-series';
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

jest.setTimeout(120_000);

const PATIENCE_MS = 15_000;

const DAY_OF_PLAN = '2026-12-09';
const EXPIRY = '2026-12-23'; // ten sessions later
const SESSIONS = 400;
const STRIKE = 1540;
const PREMIUM = 12;
const SOLD_AT = 15.5;
const FEE = 0.65;
const PASSWORD = 'three quiet hedges in may';

interface WindowCase {
  readonly series: string;
  readonly session: number;
  readonly sd: Readonly<Record<string, number>>;
  readonly ewma_first: number;
}
// Outside witness: R 4.2.2 and TTR 0.24.3, as the file says.
const windows: { groups: { cases: WindowCase[] }[] } = JSON.parse(
  readFileSync(path.join(__dirname, '../reference/data/window_vol.json'), 'utf8'),
);
const witness = windows.groups
  .flatMap(({ cases }) => cases)
  .find(({ series, session }) => series === 'DAX' && session === SESSIONS);

let app: TestApp;
let server: Server;
let browser: Browser;
let origin: string;

beforeAll(async () => {
  const port = await freePort();
  origin = `http://localhost:${port}`;
  app = await startTestApp({ PUBLIC_ORIGIN: origin, WEB_ROOT: path.resolve(__dirname, '../../dist') });
  server = app.app.listen(port, '127.0.0.1');
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser.close();
  server.closeAllConnections();
  await new Promise((resolve) => server.close(resolve));
  await app.stop();
});

describe.each(Object.entries(sizes))('the main job on a %s screen', (size, viewport) => {
  let watched: WatchedPage;
  let page: Page;
  const closes = publishedCloses();
  const spot = closes[SESSIONS - 1] ?? 0;
  const settled = closes[SESSIONS + 9] ?? 0;
  const isPhone = size === 'phone';

  const at = async (instant: string) => {
    app.clock.set(instant);
    await page.clock.setFixedTime(new Date(instant));
  };
  /** Another day: the session has ended meanwhile, and signing in leads back to the same page. */
  const comeBack = async (instant: string) => {
    await at(instant);
    await page.reload();
    await page.getByRole('heading', { name: 'Sign in' }).waitFor();
    await field('E-mail').fill(`ada-${size}@example.org`);
    await field('Password').fill(PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('heading', { name: 'Sign in' }).waitFor({ state: 'detached' });
  };
  const isClean = async () => expect(await accessibilityViolations(page)).toEqual([]);
  const upload = async (dates: readonly string[], values: readonly number[]) => {
    const chooser = page.waitForEvent('filechooser');
    await page.getByRole('button', { name: 'Choose a file' }).click();
    await (await chooser).setFiles({ name: 'closes.csv', mimeType: 'text/csv', buffer: csvOf(dates, values) });
    await page.getByText(`${dates.length} new sessions`).waitFor();
    await isClean();
    await page.getByRole('button', { name: `Store ${dates.length} bars` }).click();
    await page.getByRole('button', { name: 'See ZZIX' }).click();
  };
  // Each step builds on the one before; after a failure the rest would only wait in vain.
  let hasFailed = false;
  const step = (name: string, work: () => Promise<void>) =>
    it(name, async () => {
      if (hasFailed) throw new Error('An earlier step failed.');
      hasFailed = true;
      try {
        await work();
      } catch (error) {
        const seen = await page.locator('body').innerText();
        throw new Error(
          `${String(error)}\nConsole: ${watched.consoleErrors.join('; ')}\nOn the screen:\n${seen.slice(0, 2_000)}`,
        );
      }
      hasFailed = false;
    });
  const field = (name: string) => page.getByRole('textbox', { name, exact: true });

  beforeAll(async () => {
    watched = await openPage(browser, origin, viewport);
    page = watched.page;
    page.setDefaultTimeout(PATIENCE_MS);
    await page.clock.install({ time: new Date(`${DAY_OF_PLAN}T22:00:00Z`) });
    await at(`${DAY_OF_PLAN}T22:00:00.000Z`);
  });
  afterAll(() => watched.context.close());

  step('makes an account and is led to the first underlying', async () => {
    await page.goto(`${origin}/`);
    await page.getByRole('link', { name: 'Make an account' }).click();
    await page.getByRole('heading', { name: 'Make an account' }).waitFor();
    await isClean();
    await field('Name').fill('Ada Thorn');
    await field('E-mail').fill(`ada-${size}@example.org`);
    await field('Password').fill('too short');
    await page.getByRole('button', { name: 'Make account' }).click();
    await page.getByText('Use at least 15 characters').first().waitFor();
    await field('Password').fill(PASSWORD);
    await page.getByRole('button', { name: 'Make account' }).click();
    await page.getByRole('heading', { name: 'Today', level: 1 }).waitFor();
    await page.getByText('Add the first underlying').waitFor();
    await isClean();
  });

  step('adds an underlying and uploads its closes', async () => {
    await page.getByRole('link', { name: /Add the first underlying/ }).click();
    await field('Symbol').fill('zzix');
    await page.getByRole('radio', { name: 'European' }).click();
    await page.getByRole('radio', { name: 'Cash' }).click();
    await isClean();
    await page.getByRole('button', { name: 'Add underlying' }).click();
    await page.getByRole('heading', { name: /^Upload bars/ }).waitFor();
    await upload(sessionDatesEnding(DAY_OF_PLAN, SESSIONS), closes.slice(0, SESSIONS));
    await page.getByRole('heading', { name: 'ZZIX', level: 1 }).waitFor();
  });

  step('shows the volatility of every window as the outside witness has it', async () => {
    expect(witness).toBeDefined();
    const table = page.getByRole('table', { name: 'Daily volatility by method' });
    for (const [window, deviation] of Object.entries(witness?.sd ?? {})) {
      const row = table.getByRole('row').filter({ hasText: `${window} sessions` });
      await expectText(row.first().innerText(), `${(deviation * 100).toFixed(2)}%`);
    }
    await expectText(
      table.getByRole('row').filter({ hasText: 'λ 0.94' }).innerText(),
      `${((witness?.ewma_first ?? 0) * 100).toFixed(2)}%`,
    );
    await isClean();
  });

  step('plans a call and shows its price and odds at once', async () => {
    await page.getByRole('button', { name: 'Plan a trade' }).click();
    await page.getByRole('heading', { name: /^Plan:/ }).waitFor();
    await isClean();
    if (isPhone) await page.getByRole('button', { name: 'Next: structure' }).click();
    await page.getByRole('button', { name: 'Add the first leg' }).click();
    await field('Strike').fill('0');
    await field('Strike').fill(String(STRIKE));
    await page.getByLabel('Expiry').fill(EXPIRY);
    await field('Premium').fill(PREMIUM.toFixed(2));

    // Independent: two clocks by hand, the normal distribution of jstat.
    const deviation = (witness?.sd['21'] ?? 0) * Math.sqrt(10);
    const d2 = (Math.log(spot / STRIKE) - deviation ** 2 / 2) / deviation;
    const odds = jstat.jStat.normal.cdf(d2, 0, 1);
    const discount = Math.exp(-0.04 * (14 / 365));
    const forward = spot / discount;
    const d1 = Math.log(forward / STRIKE) / deviation + deviation / 2;
    const model =
      discount * (forward * jstat.jStat.normal.cdf(d1, 0, 1) - STRIKE * jstat.jStat.normal.cdf(d1 - deviation, 0, 1));
    await page.getByText(new RegExp(`Model \\d+\\.\\d\\d / ${model.toFixed(2)} /`)).waitFor();
    if (isPhone) await page.getByRole('button', { name: 'Next: odds' }).click();
    await page.getByText(`${STRIKE} call in the money`).first().waitFor();
    await expectText(page.getByRole('main').innerText(), `${Math.round(odds * 100)}%`);
    await isClean();
  });

  step('keeps the draft through a reload', async () => {
    await page.getByText(/^saved /).waitFor();
    await page.reload();
    await page.getByRole('heading', { name: 'Plan: ZZIX long 1540 call' }).waitFor();
  });

  step('seals it after one question', async () => {
    if (isPhone) {
      for (const next of ['structure', 'odds', 'exits', 'seal'])
        await page.getByRole('button', { name: `Next: ${next}` }).click();
      await isClean();
    }
    await field('Why this trade, and what would prove you wrong').fill(
      'The range of two weeks breaks upwards, or I am wrong.',
    );
    await page.getByRole('button', { name: 'Seal forecast' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Seal forecast' }).click();
    await page.getByRole('heading', { name: 'ZZIX long 1540 call', level: 1 }).waitFor();
    await page.getByText(`Seal 1, engine ${engineVersion}`).waitFor();
    await isClean();
  });

  step('logs entry and exit, and ties the profit to the cent', async () => {
    await comeBack('2026-12-10T15:30:00.000Z');
    await page.getByRole('button', { name: 'Add fill' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('textbox', { name: 'Price' }).fill('twelve');
    await dialog.getByRole('button', { name: 'Add fill' }).click();
    await dialog.getByText('Type a number such as 1.25.').waitFor();
    await isClean();
    await dialog.getByRole('textbox', { name: 'Price' }).fill(PREMIUM.toFixed(2));
    await dialog.getByRole('button', { name: 'Add fill' }).click();
    await dialog.waitFor({ state: 'detached' });

    await comeBack('2026-12-14T18:00:00.000Z');
    await page.getByRole('button', { name: 'Add fill' }).click();
    await dialog.getByRole('combobox', { name: 'What happened' }).selectOption('sell');
    await dialog.getByRole('textbox', { name: 'Price' }).fill(SOLD_AT.toFixed(2));
    await dialog.getByRole('button', { name: 'Add fill' }).click();
    await dialog.waitFor({ state: 'detached' });
    const profit = (SOLD_AT - PREMIUM) * 100 - 2 * FEE;
    await page
      .getByText(`+${profit.toFixed(2)}`)
      .first()
      .waitFor();
    await page.getByRole('main').getByText('Closed', { exact: true }).first().waitFor();
  });

  step('shows expected against realised once the closes are there', async () => {
    await comeBack(`${EXPIRY}T22:00:00.000Z`);
    await page.getByText('Fills', { exact: true }).first().waitFor();
    const answer: unknown = await (await watched.context.request.get(`${origin}/api/v1/underlyings`)).json();
    const [listed] = underlyingEndpoints.listUnderlyings.response.parse(answer).underlyings;
    const underlyingId = listed?.underlying.id ?? '';
    const entryAddress = page.url();
    await page.goto(`${origin}/prices/${underlyingId}/upload`);
    await upload(sessionDatesAfter(DAY_OF_PLAN, 10), closes.slice(SESSIONS, SESSIONS + 10));
    await page.getByRole('heading', { name: 'ZZIX', level: 1 }).waitFor();
    await page.goto(entryAddress);
    await page.getByText('Where it landed').waitFor();

    const deviation = (witness?.sd['21'] ?? 0) * Math.sqrt(10);
    const d2 = (Math.log(spot / STRIKE) - deviation ** 2 / 2) / deviation;
    const odds = jstat.jStat.normal.cdf(d2, 0, 1);
    const brier = (odds - (settled > STRIKE ? 1 : 0)) ** 2;
    await page
      .getByText(new RegExp(`Brier ${brier.toFixed(brier < 0.1 ? 3 : 2)}`))
      .first()
      .waitFor();
    // Closed after three sessions: the move is that of the last fill's session.
    const moved = Math.log((closes[SESSIONS + 2] ?? 0) / spot) / ((witness?.sd['21'] ?? 1) * Math.sqrt(3));
    await expectText(page.getByRole('main').innerText(), `${moved < 0 ? '−' : '+'}${Math.abs(moved).toFixed(2)}σ`);
    await isClean();
  });

  step('finishes the review three taps from Today', async () => {
    await page.goto(`${origin}/`);
    let taps = 0;
    const tap = async (target: Locator) => {
      taps += 1;
      await target.click();
    };
    await tap(page.getByRole('link', { name: /ZZIX long 1540 call is closed/ }));
    await tap(field('Lesson'));
    await isClean();
    await page.keyboard.type('Three sessions were enough.');
    await tap(page.getByRole('button', { name: 'Save lesson' }));
    await page.getByRole('main').getByText('Reviewed', { exact: true }).first().waitFor();
    expect(taps).toBe(3);
    await page.getByRole('link', { name: 'Seal', exact: true }).click();
    await expectText(page.locator(':focus').innerText(), 'Sealed plan');
    await isClean();
  });

  step('takes a rule from the week', async () => {
    await page.goto(`${origin}/review`);
    await field('The rule').fill('If the target is reached, then sell.');
    await field('Evidence').fill('One of one.');
    await isClean();
    await page.getByRole('button', { name: 'Save rule' }).click();
    await page.getByText('The rule of this week').waitFor();
    await isClean();
  });

  step('lists the resolved forecasts and signs out', async () => {
    await page.goto(`${origin}/scores`);
    await page.getByText(`ZZIX long 1540 call: 1540 call in the money`).waitFor();
    await isClean();
    await page.goto(`${origin}/desk`);
    await page.getByText('Members', { exact: true }).waitFor();
    await isClean();
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.getByRole('heading', { name: 'Sign in' }).waitFor();
    await page.goto(`${origin}/journal`);
    await page.getByRole('heading', { name: 'Sign in' }).waitFor();
  });

  it('met no console error and no other origin on the way', () => {
    expect(watched.consoleErrors).toEqual([]);
    expect(watched.foreignRequests).toEqual([]);
  });
});

async function expectText(text: Promise<string>, part: string): Promise<void> {
  expect(await text).toContain(part);
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await new Promise((resolve) => probe.once('listening', resolve));
  const { port } = probe.address() as AddressInfo; // a TCP server's address is an object
  await new Promise((resolve) => probe.close(resolve));
  return port;
}
