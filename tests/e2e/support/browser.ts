import { readFileSync } from 'node:fs';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];
const axeSource = readFileSync(require.resolve('axe-core/axe.min.js'), 'utf8');

export const sizes = { phone: { width: 390, height: 844 }, wide: { width: 1440, height: 900 } } as const;

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: '/usr/bin/chromium', args: flags });
}

/** A page that writes down what must not happen: console errors and requests to anywhere else. */
export interface WatchedPage {
  readonly context: BrowserContext;
  readonly page: Page;
  readonly consoleErrors: string[];
  readonly foreignRequests: string[];
}

export async function openPage(
  browser: Browser,
  origin: string,
  viewport: { width: number; height: number },
): Promise<WatchedPage> {
  const context = await browser.newContext({
    viewport,
    reducedMotion: 'reduce',
    timezoneId: 'America/New_York',
    locale: 'en-US',
  });
  const page = await context.newPage();
  const consoleErrors: string[] = [];
  const foreignRequests: string[] = [];
  page.on('console', (message) => {
    // A refused sign-in or an unsigned visit answers 401, which Chromium reports by itself.
    if (message.type() === 'error' && !message.text().includes('status of 401')) consoleErrors.push(message.text());
  });
  page.on('pageerror', (error) => consoleErrors.push(error.message));
  page.on('request', (request) => {
    const { origin: target, protocol } = new URL(request.url());
    if (target !== origin && protocol.startsWith('http')) foreignRequests.push(request.url());
  });
  return { context, page, consoleErrors, foreignRequests };
}

/** Violations of the rules of axe-core on the page as it stands. */
export async function accessibilityViolations(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const violations = await page.evaluate(async () => {
    const { axe } = globalThis as unknown as {
      axe: { run: (options: object) => Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> };
    }; // put there a line above
    return (await axe.run({ resultTypes: ['violations'] })).violations.map(
      ({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`,
    );
  });
  return violations;
}
