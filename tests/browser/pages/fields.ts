import type { Locator, Page } from 'playwright-core';

/** A text field by its label; a field that may stay empty says so behind its label. */
export const field = (within: Page | Locator, label: string): Locator =>
  within.getByRole('textbox', { name: new RegExp(`^${escaped(label)}( \\(|$)`) });

/** Types into a field as a person does, and leaves it, so that it is judged. */
export async function fill(within: Page | Locator, label: string, text: string): Promise<void> {
  const box = field(within, label);
  await box.fill(text);
  await box.blur();
}

export const button = (within: Page | Locator, name: string | RegExp): Locator =>
  within.getByRole('button', typeof name === 'string' ? { name, exact: true } : { name });
export const link = (within: Page | Locator, name: string | RegExp): Locator =>
  within.getByRole('link', typeof name === 'string' ? { name, exact: true } : { name });
export const choose = async (within: Page | Locator, group: string | RegExp, option: string | RegExp): Promise<void> => {
  await within.getByRole('radiogroup', { name: group }).getByRole('radio', { name: option }).click();
};

export const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
export const heading = (page: Page, name: string | RegExp): Locator => page.getByRole('heading', { name });
