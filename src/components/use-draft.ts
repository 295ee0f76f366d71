// A field that holds what is typed until it is committed: Enter or leaving commits, Esc restores, wrong input stays and says
// why, and nothing outside changes before it is right.
import { useState, type KeyboardEvent } from 'react';

export type DraftRead<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: string };

export interface DraftOptions<T> {
  /** The committed value as plain text. */
  readonly shown: string;
  readonly read: (text: string) => DraftRead<T>;
  readonly onCommit: (value: T) => void;
  /** The value one step on; `times` is negative downwards, larger with Shift. Null: nothing to step from. */
  readonly step: (times: number) => T | null;
}

export interface Draft {
  readonly text: string;
  readonly error: string | null;
  readonly isEditing: boolean;
  readonly setText: (text: string) => void;
  readonly commit: () => void;
  readonly onKeyDown: (event: KeyboardEvent<HTMLInputElement>) => void;
}

/** Steps that Shift takes at once. */
const LARGE_STEP = 8;

export function useDraft<T>({ shown, read, onCommit, step }: DraftOptions<T>): Draft {
  // null while nothing is being typed: the field then shows what is committed
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);

  const restore = (): void => {
    setTyped(null);
    setError(null);
  };
  const commit = (): void => {
    if (typed === null || typed.trim() === shown) {
      restore();
      return;
    }
    const result = read(typed);
    if (!result.ok) {
      setError(result.reason);
      return;
    }
    restore();
    onCommit(result.value);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>): void => {
    if (event.key === 'Enter') {
      // a length is committed, the form around it is not sent
      event.preventDefault();
      commit();
      event.currentTarget.select();
    } else if (event.key === 'Escape' && typed !== null) {
      // what was typed is taken back; the dialog around it stays
      event.preventDefault();
      event.stopPropagation();
      restore();
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      const next = step((event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? LARGE_STEP : 1));
      if (next === null) return;
      event.preventDefault();
      restore();
      onCommit(next);
    }
  };
  return {
    text: typed ?? shown,
    error,
    isEditing: typed !== null,
    setText: (text) => {
      setTyped(text);
      setError(null);
    },
    commit,
    onKeyDown,
  };
}
