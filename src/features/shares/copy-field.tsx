import { useEffect, useId, useRef, useState } from 'react';
import { Button } from '../../components/button';
import { copyText } from '../../lib/copy-text';

export interface CopyFieldProps {
  readonly label: string;
  readonly text: string;
  /** Several lines. */
  readonly tall?: boolean;
}

const SAYS_MS = 2500;

/** Something to take along: read-only, with a button that copies it. */
export function CopyField({ label, text, tall = false }: CopyFieldProps) {
  const id = useId();
  const field = useRef<HTMLInputElement & HTMLTextAreaElement>(null);
  const [said, setSaid] = useState<'copied' | 'select' | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  useEffect(
    () => () => {
      if (timer.current !== null) clearTimeout(timer.current);
    },
    [],
  );
  const copy = async (): Promise<void> => {
    const isCopied = await copyText(text);
    // then the person copies what is selected
    if (!isCopied) field.current?.select();
    setSaid(isCopied ? 'copied' : 'select');
    if (timer.current !== null) clearTimeout(timer.current);
    timer.current = setTimeout(() => setSaid(null), SAYS_MS);
  };
  const shared = {
    id,
    ref: field,
    readOnly: true,
    value: text,
    onFocus: () => field.current?.select(),
  };
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="text-sm font-semibold">
        {label}
      </label>
      <div className="flex flex-wrap items-start gap-2">
        {tall ? (
          <textarea {...shared} rows={5} className="input min-w-0 grow basis-56 text-sm" />
        ) : (
          <input type="text" {...shared} className="input min-w-0 grow basis-56 text-sm" />
        )}
        <Button size="small" className="!min-h-10" aria-label={`Copy: ${label}`} onClick={() => void copy()}>
          {said === 'copied' ? 'Copied' : 'Copy'}
        </Button>
      </div>
      <p role="status" className="text-sm text-soft empty:hidden">
        {said === 'copied' && 'It is on the clipboard.'}
        {said === 'select' && 'This browser does not let a page copy. It is selected: press Ctrl+C, or Cmd+C on a Mac.'}
      </p>
    </div>
  );
}
