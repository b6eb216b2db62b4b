import { chromium, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core';

const chromiumArguments = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** How long a page may take to come to what is waited for, ms. Generous: the machine may be busy. */
export const patienceMs = 60_000;

/** The installed Chromium, without a window. Close it in the end, whatever happened. */
export function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium', args: chromiumArguments });
}

/** CSS pixels of the screens the product is looked at on. */
export const desk = { viewport: { width: 1440, height: 900 } } as const;
export const phone = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true } as const;

export interface Opened {
  context: BrowserContext;
  page: Page;
  /** What the page said on its console or threw, and what its content policy stopped; empty on a sound page. */
  complaints: string[];
}

/** A browser of one person: own cookies, own storage. */
export async function openContext(
  browser: Browser,
  baseUrl: string,
  options: BrowserContextOptions = desk,
): Promise<Opened> {
  const context = await browser.newContext({
    baseURL: baseUrl,
    locale: 'en-US',
    timezoneId: 'America/Denver',
    ...options,
  });
  context.setDefaultTimeout(patienceMs);
  context.setDefaultNavigationTimeout(patienceMs);
  const page = await context.newPage();
  return { context, page, complaints: collectComplaints(page) };
}

/** Asking for a session without having one is answered 401; Chromium writes every such answer on the console. */
const expectedRefusal = /\/api\/auth\/refresh$/;

function collectComplaints(page: Page): string[] {
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(`thrown: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() !== 'error' && !/content security policy/i.test(message.text())) return;
    if (expectedRefusal.test(new URL(message.location().url || 'about:blank').pathname)) return;
    complaints.push(`${message.type()}: ${message.text()} (${message.location().url})`);
  });
  return complaints;
}
