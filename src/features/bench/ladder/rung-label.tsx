import type { Scene } from '#shared/scene';
import { classes } from '../../../components/classes';
import { pairName } from '../finding-words';
import { Reading } from '../reading';
import type { Rung } from './rungs';

interface RungLabelProps {
  readonly rung: Rung;
  readonly scene: Scene;
  readonly isOpen: boolean;
  /** Deeper than the rule reaches. */
  readonly isPinned: boolean;
  readonly height: number;
  readonly onOpen: () => void;
  readonly onPoint: (isOver: boolean) => void;
}

export const RungLabel = ({ rung, scene, isOpen, isPinned, height, onOpen, onPoint }: RungLabelProps) => (
  <button
    type="button"
    className={classes('rung', isOpen && 'rung-open')}
    style={{ height }}
    aria-expanded={isOpen}
    onClick={onOpen}
    onPointerEnter={() => onPoint(true)}
    onPointerLeave={() => onPoint(false)}
    onFocus={() => onPoint(true)}
    onBlur={() => onPoint(false)}
  >
    <span className="rung-name">{pairName(scene, rung.finding)}</span>
    <Reading finding={rung.finding} />
    {isPinned && (
      <span className="rung-deeper" aria-label="deeper than the rule shows">
        {'\u2193'}
      </span>
    )}
  </button>
);
