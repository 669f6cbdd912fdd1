import type { Locator, Page } from 'playwright-core';

/** The results of a round. */
export class ResultsPage {
  constructor(private readonly page: Page) {}

  answer(title: string): Locator {
    return this.page.getByRole('heading', { name: title, exact: true });
  }
  /** Both answers as they read, one after the other. */
  async answers(): Promise<string> {
    return (await this.page.getByRole('region', { name: 'The answers' }).innerText()).replace(/\s+/g, ' ');
  }
  /** What stands beside a label. */
  async row(label: string): Promise<string> {
    const words = await this.page.getByRole('group', { name: label, exact: true }).innerText();
    return words.replace(label, '').trim();
  }
  async tableCell(station: string, column: string): Promise<string> {
    const table = this.page.getByRole('table', { name: 'Stations' });
    const columns = await table.getByRole('columnheader').allInnerTexts();
    const row = table.getByRole('row').filter({ has: this.page.getByRole('cell', { name: station, exact: true }) });
    return (await row.getByRole('cell').nth(columns.indexOf(column)).innerText()).trim();
  }
}
