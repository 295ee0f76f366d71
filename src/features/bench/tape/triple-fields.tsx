// Three lengths or numbers in a row, one for each axis of the car.
import { LengthField } from '../../../components/length-field';
import { TextField } from '../../../components/text-field';
import { useFacts } from '../bench-model';
import type { Triple } from '../viewport/vectors';
import { useState } from 'react';
import { parsePlain } from './parse-plain';

export interface TripleFieldsProps {
  readonly legend: string;
  readonly labels: readonly [string, string, string];
  readonly value: Triple;
  readonly disabled: boolean;
  readonly least?: number;
  readonly onCommit: (value: Triple) => void;
}

const put = (value: Triple, k: number, x: number): Triple =>
  value.map((old, i) => (i === k ? x : old)) as unknown as Triple;

export function LengthTriple({ legend, labels, value, disabled, least, onCommit }: TripleFieldsProps) {
  const { display } = useFacts();
  return (
    <fieldset className="triple">
      <legend>{legend}</legend>
      {labels.map((label, k) => (
        <LengthField
          key={label}
          label={label}
          look="measure"
          display={display}
          value={value[k]!}
          signed="absolute"
          least={least}
          disabled={disabled}
          onCommit={(mm) => onCommit(put(value, k, mm))}
        />
      ))}
    </fieldset>
  );
}

/** A direction: only its proportions count. */
export function DirectionTriple({ legend, labels, value, disabled, onCommit }: TripleFieldsProps) {
  return (
    <fieldset className="triple">
      <legend>{legend}</legend>
      {labels.map((label, k) => (
        <NumberBox
          key={label}
          label={label}
          value={value[k]!}
          disabled={disabled}
          onCommit={(x) => {
            const next = put(value, k, x);
            if (next.some((n) => n !== 0)) onCommit(next);
          }}
        />
      ))}
    </fieldset>
  );
}

interface NumberBoxProps {
  readonly label: string;
  readonly value: number;
  readonly disabled: boolean;
  readonly onCommit: (value: number) => void;
}

export function NumberBox({ label, value, disabled, onCommit }: NumberBoxProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const commit = (): void => {
    if (typed === null) return;
    const read = parsePlain(typed);
    if (read === null) {
      setError('Type a number, like 0.5.');
      return;
    }
    setTyped(null);
    setError(null);
    if (read !== value) onCommit(read);
  };
  return (
    <TextField
      label={label}
      inputMode="decimal"
      value={typed ?? String(Math.round(value * 1e6) / 1e6)}
      disabled={disabled}
      error={error}
      onChange={(event) => {
        setTyped(event.target.value);
        setError(null);
      }}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commit();
      }}
    />
  );
}
