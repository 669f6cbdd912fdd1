import type { Page } from 'playwright-core';
import { button, fill } from './fields';

/** Signs a new company up; whoever does has all four roles. */
export async function signUp(
  page: Page,
  origin: string,
  who: { company: string; name: string; email: string; password: string },
): Promise<void> {
  await page.goto(`${origin}/sign-up`);
  await fill(page, 'Company', who.company);
  await fill(page, 'Your name', who.name);
  await fill(page, 'E-mail', who.email);
  await fill(page, 'Password', who.password);
  await button(page, 'Sign up').click();
  await page.getByRole('heading', { name: 'Today', level: 1 }).waitFor();
}

export async function signIn(page: Page, origin: string, who: { email: string; password: string }): Promise<void> {
  await page.goto(`${origin}/sign-in`);
  await fill(page, 'E-mail', who.email);
  await fill(page, 'Password', who.password);
  await button(page, 'Sign in').click();
  await page.getByRole('heading', { name: 'Today', level: 1 }).waitFor();
}
