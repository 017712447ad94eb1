import type { Page } from 'playwright-core';

/** A bar that appeared by itself is deaf for a second; people take longer than that, tests do not. */
const deafMilliseconds = 1200;

/** Puts the signed-in person on the turn of a train, from the list of turns. */
export async function takeTurn(page: Page, train: string): Promise<void> {
  await page.goto('/my');
  await page.getByRole('link', { name: new RegExp(`\\b${train} out`) }).click();
  const take = page.getByRole('button', { name: /I have this turn/ });
  await take.waitFor();
  await page.waitForTimeout(deafMilliseconds);
  await take.click();
  await page.getByRole('region', { name: /^(Next step|After this)$/ }).waitFor();
}

/** Waits until the next step stands under the bar, going on at once where the page offers it. */
async function toNextStep(page: Page): Promise<string> {
  const goOn = page.getByRole('button', { name: /^Go on to / });
  const next = page.getByRole('region', { name: 'Next step' });
  await goOn.or(next).first().waitFor({ timeout: 20_000 });
  if (await goOn.isVisible()) await goOn.click();
  await next.waitFor({ timeout: 20_000 });
  return (await next.getByRole('heading').innerText()).trim();
}

/** Types what the step asks to be read off or counted, where it asks for anything. */
async function putIn(page: Page): Promise<void> {
  const pad = page.getByRole('group', { name: /^Number pad for / });
  if (!(await pad.isVisible())) return;
  const name = (await pad.getAttribute('aria-label')) ?? '';
  for (const digit of name.includes('handbrakes') ? ['2'] : ['1', '1', '0'])
    await pad.getByRole('button', { name: digit, exact: true }).click();
}

/** Records whatever is next on the turn page and answers what it was. Steps that are too early are recorded all the same. */
export async function recordNext(page: Page): Promise<string> {
  const label = await toNextStep(page);
  const lift = page.getByRole('button', { name: 'It has happened: record it' });
  if (await lift.isVisible()) await lift.click();
  await putIn(page);
  await page.waitForTimeout(deafMilliseconds);
  await page.getByRole('button', { name: /Record now|Record for earlier/ }).click();
  const second = page.getByRole('region', { name: 'Second touch' }).getByRole('button');
  await page
    .getByText(/^Done \d/)
    .or(second)
    .first()
    .waitFor();
  if (await second.isVisible()) await second.click();
  await page.getByText(/^Done \d/).waitFor();
  return label;
}
