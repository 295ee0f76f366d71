import { useState } from 'react';

/** What has the focus; for an item of a menu, the button that opened the menu, as the item is gone in a moment. */
function focusedNow(): HTMLElement | null {
  const focused = document.activeElement;
  if (!(focused instanceof HTMLElement)) return null;
  const trigger = focused.closest('[role="menu"]')?.getAttribute('aria-labelledby');
  return trigger === null || trigger === undefined ? focused : document.getElementById(trigger);
}

/** For a dialog that is opened by state: gives the focus back, on closing, to what had it on opening. */
export function useOpener(open: boolean): (event: Event) => void {
  const [opening, setOpening] = useState<{ readonly open: boolean; readonly by: HTMLElement | null }>({
    open: false,
    by: null,
  });
  // while rendering, as the focus is moved in the very commit that shows the dialog
  if (open !== opening.open) setOpening({ open, by: open ? focusedNow() : opening.by });
  return (event) => {
    event.preventDefault();
    if (opening.by?.isConnected === true) opening.by.focus();
  };
}

/** For a dialog: Esc in a field that is being typed in belongs to the field, which takes back what was typed. */
export function leaveToField(event: Event): void {
  if (event.target instanceof Element && event.target.matches('[data-drafting]')) event.preventDefault();
}
