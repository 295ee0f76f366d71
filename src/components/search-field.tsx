import { useEffect, useRef, useState } from 'react';
import { IconButton } from './icon-button';
import { CrossMark, LoupeMark } from './pictograms';

export interface SearchFieldProps {
  readonly label: string;
  readonly value: string;
  /** Called once typing rests. */
  readonly onSearch: (text: string) => void;
  readonly className?: string;
}

const REST_MS = 250;

export function SearchField({ label, value, onSearch, className }: SearchFieldProps) {
  const [text, setText] = useState(value);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const stop = (): void => {
    if (timer.current !== null) clearTimeout(timer.current);
  };
  useEffect(() => stop, []);
  const change = (next: string, wait: number): void => {
    setText(next);
    stop();
    timer.current = setTimeout(() => onSearch(next.trim()), wait);
  };
  return (
    <div role="search" className={className}>
      <div className="relative">
        <LoupeMark className="pointer-events-none absolute top-1/2 left-2.5 -translate-y-1/2 text-soft" />
        <input
          type="text"
          inputMode="search"
          enterKeyHint="search"
          autoComplete="off"
          maxLength={120}
          aria-label={label}
          placeholder={label}
          className="input !px-9"
          value={text}
          onChange={(event) => change(event.target.value, REST_MS)}
          onKeyDown={(event) => {
            if (event.key === 'Escape' && text !== '') change('', 0);
            else if (event.key === 'Enter') change(text, 0);
          }}
        />
        {text !== '' && (
          <IconButton
            label="Clear the search"
            hint={false}
            className="!absolute top-1/2 right-1 -translate-y-1/2"
            onClick={() => change('', 0)}
          >
            <CrossMark />
          </IconButton>
        )}
      </div>
    </div>
  );
}
