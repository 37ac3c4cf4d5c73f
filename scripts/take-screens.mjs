// Pictures of the main screens of a running demo desk: `node scripts/take-screens.mjs [ADDRESS] [FOLDER] [light|dark|both]`.
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { chromium } from 'playwright-core';
import { inRoot } from './places.mjs';

const [address = 'http://localhost:8080', folder = inRoot('docs/screens'), theme = 'light'] = process.argv.slice(2);
const sizes = { phone: { width: 390, height: 844 }, wide: { width: 1440, height: 900 } };
const person = { email: 'mara@alderlane.example', password: 'bramble hedge lantern' };
mkdirSync(folder, { recursive: true });

const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
  ],
});
const problems = [];
try {
  for (const [size, viewport] of Object.entries(sizes)) {
    for (const colorScheme of theme === 'both' ? ['light', 'dark'] : [theme]) await tour(size, viewport, colorScheme);
  }
} finally {
  await browser.close();
}
for (const problem of problems) console.error(problem);
process.exitCode = problems.length > 0 ? 1 : 0;

async function tour(size, viewport, colorScheme) {
  const context = await browser.newContext({ viewport, colorScheme, reducedMotion: 'reduce' });
  const page = await context.newPage();
  page.on(
    'console',
    (message) => message.type() === 'error' && problems.push(`${size} ${page.url()}: ${message.text()}`),
  );
  page.on('pageerror', (error) => problems.push(`${size} ${page.url()}: ${error.message}`));
  const shoot = async (name) => {
    await page.evaluate(() => document.fonts.ready);
    await page.waitForTimeout(400); // charts measure themselves once, then draw
    await page.screenshot({ path: path.join(folder, `${name}-${size}-${colorScheme}.png`) });
  };
  const get = async (endpoint) => (await context.request.get(`${address}/api/v1${endpoint}`)).json();

  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').waitFor();
  await shoot('01-sign-in');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByRole('textbox', { name: 'Password' }).fill(person.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('heading', { name: 'Today', level: 1 }).waitFor();
  await shoot('02-today');

  const { entries } = await get('/entries?limit=200');
  const { underlyings } = await get('/underlyings');
  const draft = entries.find(({ state }) => state === 'draft');
  const reviewed =
    entries.find(({ state, strip }) => state === 'reviewed' && strip.target !== null) ??
    entries.find(({ state }) => state === 'reviewed');
  const stops = [
    ['03-journal', '/journal', 'Journal'],
    ['05-entry', `/journal/${reviewed.id}`, reviewed.underlying.symbol],
    ['04-planner', `/plan/${draft.id}`, 'Plan:'],
    ['07-prices', '/prices', 'Prices'],
    ['07-underlying', `/prices/${underlyings[1].underlying.id}`, underlyings[1].underlying.symbol],
    ['08-upload', `/prices/${underlyings[1].underlying.id}/upload`, 'Upload bars'],
    ['09-scores', '/scores', 'Scores'],
    ['12-review', '/review', 'Weekly review'],
    ['10-desk', '/desk', 'Alder Lane'],
    ['11-caution', '/caution', 'Estimates, not advice'],
  ];
  for (const [name, where, heading] of stops) {
    await page.goto(`${address}${where}`);
    await page.getByRole('heading', { name: heading }).first().waitFor();
    await shoot(name);
    if (name === '04-planner' && size === 'phone') {
      for (const [index, step] of ['Structure', 'Odds', 'Exits', 'Seal'].entries()) {
        await page
          .getByRole('tab', { name: new RegExp(step) })
          .or(page.getByRole('button', { name: new RegExp(`^${step}`) }))
          .first()
          .click();
        await shoot(`04-planner-${index + 2}-${step.toLowerCase()}`);
      }
    }
  }
  await context.close();
}
