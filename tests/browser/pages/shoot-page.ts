import type { Locator, Page } from 'playwright-core';
import { button, link } from './fields';

/** The shoot screen, by what a person sees and presses. */
export class ShootPage {
  /** Keys pressed since the last `taps()`. */
  private pressed = 0;

  constructor(private readonly page: Page) {}

  station(name: string): Locator {
    return this.page.getByRole('heading', { name, level: 2, exact: true });
  }
  async press(name: string | RegExp): Promise<void> {
    this.pressed += 1;
    await button(this.page, name).first().click();
  }
  /** How many keys were pressed since this was last asked. */
  taps(): number {
    const { pressed } = this;
    this.pressed = 0;
    return pressed;
  }
  async digits(digits: string): Promise<void> {
    const pad = this.page.getByRole('group', { name: 'Digits' });
    for (const digit of digits) {
      this.pressed += 1;
      await button(pad, digit).click();
    }
  }
  /** Keys a whole reading on the keypad: feet, inches, then the fraction. */
  async keyFeetInches(feet: string, inches: string, fraction: string): Promise<void> {
    // The benchmark check opens on its digits; a station on its fractions.
    if (await button(this.page, 'Keypad').isVisible()) await this.press('Keypad');
    await this.digits(feet);
    await this.press('Inches');
    await this.digits(inches);
    await this.press('Fraction');
    await this.press(fraction);
  }
  async record(): Promise<void> {
    await this.press('Record');
  }
  async seeResults(): Promise<void> {
    await link(this.page, 'See results').or(button(this.page, 'See results')).click();
  }
}
