import type { Locator } from 'playwright-core';

/** A refused entry as a person sees it. */
export interface Refused {
  /** The sentence that is tied to the field. */
  says: string;
  /** What stands in the field still. */
  typed: string;
  /** Which of the two cannot be seen without scrolling, or lies under something else; nothing, as it should be. */
  hidden: string[];
}

/**
 * Waits until a field says that it is refused, and reads its sentence.
 *
 * @param field carries aria-invalid and names its sentence in aria-describedby, as assistive technology finds it
 */
export async function refusalOf(field: Locator): Promise<Refused> {
  await field.and(field.page().locator('[aria-invalid="true"]')).waitFor();
  return field.evaluate((box: HTMLInputElement) => {
    const described = (box.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id));
    const sentence = described.find((element) => element?.getAttribute('role') === 'alert') ?? null;
    // A key of the keypad types past the input: what is keyed is drawn in the element that tells the reading.
    const reads = described.find((element) => element?.id.endsWith('-reads'));
    // A fraction is drawn stacked, as on the rod; in words it is said as one.
    const drawn = reads?.querySelector('[role="img"]')?.getAttribute('aria-label') ?? reads?.textContent ?? '';
    const seen = (element: Element | null): boolean => {
      if (element === null) return false;
      const { left, right, top, bottom } = element.getBoundingClientRect();
      const whole = top >= 0 && left >= 0 && bottom <= window.innerHeight && right <= window.innerWidth;
      const at = document.elementFromPoint((left + right) / 2, (top + bottom) / 2);
      return whole && at !== null && (element.contains(at) || at.contains(element));
    };
    return {
      says: (sentence?.textContent ?? '').trim(),
      typed: box.value === '' ? drawn : box.value,
      hidden: [...(seen(box) ? [] : ['the field']), ...(seen(sentence) ? [] : ['the sentence'])],
    };
  });
}

/** Whether something is seen whole, without scrolling. */
export const isOnGlass = (locator: Locator): Promise<boolean> =>
  locator.evaluate((element) => {
    const { left, right, top, bottom } = element.getBoundingClientRect();
    const at = document.elementFromPoint((left + right) / 2, (top + bottom) / 2);
    const whole = top >= 0 && left >= 0 && bottom <= window.innerHeight && right <= window.innerWidth;
    return whole && at !== null && (element.contains(at) || at.contains(element));
  });
