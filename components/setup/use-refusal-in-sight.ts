import { useEffect } from 'react';
import type { SetupRefusal } from './use-setup';

/**
 * Brings the sentence of a refusal onto the glass. The button that was pressed is in sight at the thumb or at the top; the field that it
 * is about may be a screen away, and a press that seems to do nothing is pressed again.
 */
export function useRefusalInSight(refusal: SetupRefusal | null): void {
  // Each press makes a refusal of its own, so that the same one said again is brought into sight again.
  useEffect(() => {
    if (refusal === null || typeof document === 'undefined') return;
    const said = [...document.querySelectorAll('[role="alert"]')].find(({ textContent }) => textContent === refusal.sentence);
    said?.scrollIntoView({ block: 'center' });
  }, [refusal]);
}
