import type { Page } from 'playwright-core';
import { button, choose, fill, link } from './fields';

/** Picks laser, rod and benchmark, marks the laser in the middle of the plan, reads the backsight, and starts shooting. */
export async function setUp(
  page: Page,
  setup: { laser: string; rod: string; benchmark: string; distance: string; backsight: string; hi: string },
): Promise<void> {
  await choose(page, 'Laser', new RegExp(`^${setup.laser}`));
  await choose(page, 'Rod', new RegExp(`^${setup.rod}`));
  await choose(page, 'Benchmark', new RegExp(`^${setup.benchmark}`));
  await button(page, 'In the middle').click();
  await fill(page, 'Laser to benchmark', setup.distance);
  await fill(page, `Rod reading on ${setup.benchmark}`, setup.backsight);
  await button(page, 'Record the backsight').click();
  await page.getByText(setup.hi).first().waitFor();
  await link(page, 'Start shooting').or(button(page, 'Start shooting')).click();
  await button(page, 'Record').waitFor();
}
