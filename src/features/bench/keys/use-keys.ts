import { useEffect } from 'react';
import { notify } from '../../../components/toast';
import { useBench, useFacts } from '../bench-model';
import { stepFor } from '../steps';
import { keyName, KEYS } from './key-map';

/** Fields keep their keys; so do lists, sliders and open dialogs. */
function isTaken(target: EventTarget | null, key: string): boolean {
  if (document.querySelector('[role="dialog"],[role="alertdialog"],[role="menu"]') !== null) return true;
  if (!(target instanceof HTMLElement)) return false;
  if (target.isContentEditable || target.matches('input:not([type="range"]), textarea, select')) return true;
  if (target.matches('input[type="range"], [role="tab"]')) return /^(Arrow|Page|Home|End)/.test(key);
  // on a button the letters still work, but not what presses it
  return false;
}

export function useKeys(): void {
  const bench = useBench();
  const { display } = useFacts();
  useEffect(() => {
    const press = (event: KeyboardEvent): void => {
      if (event.defaultPrevented || isTaken(event.target, event.key)) return;
      const name = keyName(event);
      const deed = KEYS.find((k) => k.keys.includes(name));
      if (deed === undefined) return;
      if (deed.edits === true && !bench.open.getState().canEdit) return;
      event.preventDefault();
      deed.run(
        {
          ...bench,
          step: stepFor(display, bench.session.getState().step),
          say: (text, undo) => notify({ text, ...(undo === undefined ? {} : { undo }) }),
        },
        event.key,
      );
    };
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, [bench, display]);
}
