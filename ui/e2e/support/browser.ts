import { accessSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** The system's browser. */
export const chromiumPath: string = process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium';

/** Whether the browser is there; on a build machine a missing browser is a failure, not a reason to skip. */
export function browserIsMissing(): boolean {
  try {
    accessSync(chromiumPath);
    return false;
  } catch {
    if (process.env['CI'] === 'true') throw new Error(`no browser at ${chromiumPath}`);
    return true;
  }
}

/** Chromium without its own background traffic. */
export const launchArguments: string[] = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Starts headless Chromium. */
export function openBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: chromiumPath, args: launchArguments });
}

/** Window sizes of the two shells. */
export const desk = { width: 1440, height: 900 };
export const phone = { width: 390, height: 844 };

/** A window of its own, with an address to start from. Fails the test on an uncaught error in the page. */
export async function openWindow(
  browser: Browser,
  baseURL: string,
  viewport: { width: number; height: number },
  colorScheme: 'light' | 'dark' = 'light',
): Promise<{ context: BrowserContext; page: Page; errors: string[] }> {
  const touch = viewport.width < 600;
  const context = await browser.newContext({
    baseURL,
    viewport,
    colorScheme,
    hasTouch: touch,
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(error.message));
  return { context, page, errors };
}

/** Signs in on the sign-in page. */
export async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  // A phone begins with the badge.
  const byEmail = page.getByRole('button', { name: 'Sign in with e-mail and password' });
  await byEmail.or(page.getByLabel('E-mail')).first().waitFor();
  if (await byEmail.isVisible()) await byEmail.click();
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).first().click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

const wcagTags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Serious and critical findings of axe (WCAG 2.2 A and AA) on the page as it stands, one line each. */
export async function seriousFindings(page: Page): Promise<string[]> {
  return findingsOf(new AxeBuilder({ page }).withTags(wcagTags));
}

/** Findings about contrast alone: what can change when only the colours of a page do. */
export async function contrastFindings(page: Page): Promise<string[]> {
  return findingsOf(new AxeBuilder({ page }).withRules(['color-contrast']));
}

async function findingsOf(axe: AxeBuilder): Promise<string[]> {
  // No frames to look into, so no second page to gather their results on.
  const { violations } = await axe.setLegacyMode(true).analyze();
  return violations
    .filter((violation) => violation.impact === 'serious' || violation.impact === 'critical')
    .flatMap((violation) => violation.nodes.map((node) => `${violation.id}: ${node.target.join(' ')}`));
}
