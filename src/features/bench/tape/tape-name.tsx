// A name that is written over in place: Enter or leaving keeps it, Esc restores it.
import { useState } from 'react';
import { MAX_NAME } from '#shared/scene';
import { useOpen } from '../bench-model';

interface TapeNameProps {
  readonly name: string;
  readonly label: string;
  readonly onRename: (name: string) => void;
}

export function TapeName({ name, label, onRename }: TapeNameProps) {
  const canEdit = useOpen((o) => o.canEdit);
  const [typed, setTyped] = useState<string | null>(null);
  if (!canEdit) return <h2 className="tape-title">{name}</h2>;
  const commit = (): void => {
    const next = typed?.trim() ?? '';
    setTyped(null);
    if (next !== '' && next !== name) onRename(next);
  };
  return (
    <h2 className="tape-title">
      <textarea
        className="tape-name"
        aria-label={label}
        rows={1}
        maxLength={MAX_NAME}
        spellCheck={false}
        value={typed ?? name}
        onChange={(event) => setTyped(event.target.value.replace(/\n/g, ' '))}
        onBlur={commit}
        onKeyDown={(event) => {
          event.stopPropagation();
          if (event.key === 'Enter') {
            event.preventDefault();
            event.currentTarget.blur();
          } else if (event.key === 'Escape') {
            setTyped(null);
          }
        }}
      />
    </h2>
  );
}
