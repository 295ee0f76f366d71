// A part's shop tag: punched hole, name, finish, the mark of its worst finding, and the eye.
import type { Verdict } from '#shared/check';
import type { Component } from '#shared/scene';
import { classes } from '../../../components/classes';
import { Hole } from '../../../components/hole';
import { VerdictMark } from '../../../components/verdict-mark';
import { finishOf } from '../../../lib/finishes';
import type { Presence } from '../session';
import { EyeMark } from './eye-mark';
import { nameWidth } from './tag-width';

export interface PartTagProps {
  readonly part: Component;
  readonly worst: Verdict | undefined;
  readonly isChosen: boolean;
  /** It would go along with what is selected: its group is meant. */
  readonly goesAlong: boolean;
  readonly isHovered: boolean;
  readonly presence: Presence | undefined;
  readonly onChoose: (adds: boolean) => void;
  readonly onEye: () => void;
  readonly onPoint: (isOver: boolean) => void;
}

const EYE_DEED: Readonly<Record<Presence | 'whole', (name: string) => string>> = {
  whole: (name) => `Fade ${name}`,
  faded: (name) => `Take ${name} off the bench`,
  off: (name) => `Put ${name} back on the bench`,
};

export function PartTag({
  part,
  worst,
  isChosen,
  goesAlong,
  isHovered,
  presence,
  onChoose,
  onEye,
  onPoint,
}: PartTagProps) {
  const isTold = worst !== undefined && worst !== 'clears' && worst !== 'seated';
  return (
    <div
      className={classes(
        'tag',
        isChosen && 'tag-is-chosen',
        goesAlong && 'tag-goes-along',
        isHovered && 'tag-is-hovered',
        presence !== undefined && `tag-is-${presence}`,
      )}
      onPointerEnter={() => onPoint(true)}
      onPointerLeave={() => onPoint(false)}
    >
      <button
        type="button"
        className="on-card cut-tag tag-face"
        style={{ borderBottomColor: `var(--${finishOf(part.category)})` }}
        aria-pressed={isChosen || goesAlong}
        data-part={part.id}
        onClick={(event) => onChoose(event.shiftKey)}
      >
        <Hole through="var(--dye-deep)" />
        <span className="tag-name" style={{ width: nameWidth(part.name) }} title={part.name}>
          {part.name}
        </span>
        {isTold && <span className="sr-only">, </span>}
        {isTold && <VerdictMark verdict={worst} wordHidden className="tag-verdict" />}
        {part.source === 'guess' && <span className="sr-only">, measures are a guess</span>}
        {presence === 'faded' && <span className="sr-only">, faded</span>}
        {presence === 'off' && <span className="sr-only">, off the bench</span>}
      </button>
      <button
        type="button"
        className="tag-eye"
        aria-label={EYE_DEED[presence ?? 'whole'](part.name)}
        title={EYE_DEED[presence ?? 'whole'](part.name)}
        onClick={onEye}
      >
        <EyeMark presence={presence} />
      </button>
    </div>
  );
}
