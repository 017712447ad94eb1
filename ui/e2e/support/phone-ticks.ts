import type { Page } from 'playwright-core';

/** One act a crew records on the phone, as the test notes it down. */
export interface Tick {
  turnId: string;
  kind: 'step-done' | 'note' | 'crew';
  /** Key of the step, or the words of the note. */
  what: string;
  /** By the machine's clock, which is the service's. */
  from: number;
  to: number;
}

/** Steps that ask for nothing to be read off, by key and by the words of the list. */
export const PLAIN_STEPS = [
  ['cab-brake-check', 'Cab brake check'],
  ['ends-changed', 'Ends changed'],
  ['leaving-end-test', 'Leaving-end test'],
  ['running-test', 'Running test'],
] as const;

/** Opens a turn from the list, without loading the page anew. */
export async function openTurn(page: Page, train: string): Promise<void> {
  const myTurns = page.getByRole('link', { name: 'My turns' });
  if (await myTurns.isVisible()) await myTurns.click();
  await page.getByRole('link', { name: new RegExp(`\\b${train} out`) }).click();
  await page.getByRole('button', { name: 'Desk', exact: true }).waitFor();
}

/** Records a step out of the list of all steps, and waits for the bar to say that it is done. */
export async function tickStep(page: Page, label: string): Promise<void> {
  await page.getByRole('button', { name: /^All steps/ }).click();
  await page.getByRole('button', { name: new RegExp(`^${label} `) }).click();
  const lift = page.getByRole('button', { name: 'It has happened: record it' });
  const bar = page.getByRole('button', { name: /Record now/ });
  await lift.or(bar).first().waitFor();
  if (await lift.isVisible()) await lift.click();
  await bar.click();
  await page
    .getByRole('group', { name: label })
    .getByText(/^Done \d/)
    .waitFor();
}

/** Writes a note to the desk, and waits for the bar to say that it is done. */
export async function tickNote(page: Page, words: string): Promise<void> {
  await page.getByRole('button', { name: 'Desk', exact: true }).click();
  await page.getByLabel('What the desk should know').fill(words);
  await page.getByRole('button', { name: 'Send to desk' }).click();
  await page
    .getByRole('group', { name: 'Note to the desk' })
    .getByText(/^Done \d/)
    .waitFor();
}
