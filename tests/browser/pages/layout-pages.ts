import type { Page } from 'playwright-core';
import { button, fill, heading, link } from './fields';

export interface RunToKey {
  length: string;
  turn: 'Right' | 'Left';
}

/** Keys the runs in walking order, as a person walks them, and goes on to the stations. */
export async function drawOutline(page: Page, runs: readonly RunToKey[]): Promise<void> {
  await page.getByRole('heading', { name: 'Footing outline', level: 1 }).waitFor();
  await button(page, 'Add run').first().click();
  for (const [index, run] of runs.entries()) {
    const editor = page.getByRole('group', { name: `Run ${index + 1}`, exact: true });
    await fill(editor, `Length of run ${index + 1}`, run.length);
    await editor.getByRole('radio', { name: run.turn, exact: true }).click();
    await button(editor, index === runs.length - 1 ? `Done with run ${index + 1}` : 'Next run').click();
  }
  await page.getByText('The outline closes.').waitFor();
}

export async function layStations(page: Page, spacing: string, count: number): Promise<void> {
  await button(page, 'Set stations').click();
  await page.getByRole('heading', { name: 'Stations', level: 1 }).waitFor();
  await fill(page, 'No further apart than', spacing);
  await button(page, `Lay out ${count} stations`).click();
  await link(page, 'Back to the footing').waitFor();
}

export async function openTopRound(page: Page): Promise<void> {
  await link(page, 'Back to the footing').click();
  await heading(page, /^Open a round$/).waitFor();
  await button(page, 'Open a round of the top').click();
  await page.getByRole('heading', { name: 'Set up the laser', level: 1 }).waitFor();
}
