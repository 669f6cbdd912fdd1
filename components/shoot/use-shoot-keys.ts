import { useEffect, useRef, type RefObject } from 'react';
import type { TextInput } from 'react-native';

interface ShootKeysActions {
  /** Enter, anywhere but on a button. */
  onRecord: () => void;
  /** Left and right: from station to station. */
  onStep?: (by: 1 | -1) => void;
  /** Up and down: an inch; with Shift a foot. */
  onInch: (by: 1 | -1, foot: boolean) => void;
  onErase: () => void;
  /** Where typed characters go. */
  field: RefObject<TextInput | null>;
  /** Off while a question stands open. */
  enabled: boolean;
}

const FIELDS = 'input, textarea, select, [contenteditable="true"]';
const CONTROLS = 'a, button, [role="button"], [role="link"], [role="radio"], [role="checkbox"]';
const TYPED = /^[0-9'"′″.,/\-−]$/;

/**
 * The whole screen by keyboard, wherever the focus is: digits and marks go into the reading, arrows walk and step, Enter
 * records. A control that has the focus keeps its own keys.
 */
export function useShootKeys(actions: ShootKeysActions): void {
  const current = useRef(actions);
  useEffect(() => {
    current.current = actions;
  });
  useEffect(() => {
    if (typeof document === 'undefined') return undefined;
    const onKeyDown = (event: KeyboardEvent) => {
      if (current.current.enabled && !event.defaultPrevented && !event.ctrlKey && !event.metaKey && !event.altKey) {
        handle(event, current.current);
      }
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);
}

function handle(event: KeyboardEvent, { onRecord, onStep, onInch, onErase, field }: ShootKeysActions): void {
  const at = event.target instanceof Element ? event.target : null;
  const inField = at !== null && at.matches(FIELDS);
  const empty = !(at instanceof HTMLInputElement) || at.value === '';
  const onRadio = at !== null && at.closest('[role="radiogroup"]') !== null;
  if (onRadio) return;
  const taken = () => event.preventDefault();
  switch (event.key) {
    case 'ArrowLeft':
    case 'ArrowRight':
      if (!empty || !onStep) return;
      taken();
      return onStep(event.key === 'ArrowRight' ? 1 : -1);
    case 'ArrowUp':
    case 'ArrowDown':
      taken();
      return onInch(event.key === 'ArrowUp' ? 1 : -1, event.shiftKey);
    case 'Enter':
      // In the field its own submit records.
      if (inField || at?.closest(CONTROLS)) return;
      taken();
      return onRecord();
    case 'Backspace':
      if (inField && !empty) return;
      taken();
      return onErase();
    default:
      // The character itself lands in the field, because that has the focus by the time it is typed.
      if (!inField && TYPED.test(event.key)) field.current?.focus();
  }
}
