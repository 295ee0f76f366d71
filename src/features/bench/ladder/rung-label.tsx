import type { Scene } from '#shared/scene';
import { classes } from '../../../components/classes';
import { nameOf, pairName } from '../../../lib/finding-words';
import { Reading } from '../reading';
import { LABEL_HEIGHT, type LabelForm } from './label-form';
import type { Rung } from './rungs';

interface RungLabelProps {
  readonly rung: Rung;
  readonly scene: Scene;
  readonly form: LabelForm;
  readonly isOpen: boolean;
  /** Deeper than the rule reaches. */
  readonly isPinned: boolean;
  readonly onOpen: () => void;
  readonly onPoint: (isOver: boolean) => void;
}

export function RungLabel({ rung, scene, form, isOpen, isPinned, onOpen, onPoint }: RungLabelProps) {
  const { finding } = rung;
  return (
    <button
      type="button"
      className={classes('rung', `rung-${form}`, isOpen && 'rung-open')}
      style={{ height: LABEL_HEIGHT[form] }}
      title={form === 'line' ? undefined : pairName(scene, finding)}
      aria-expanded={isOpen}
      onClick={onOpen}
      onPointerEnter={() => onPoint(true)}
      onPointerLeave={() => onPoint(false)}
      onFocus={() => onPoint(true)}
      onBlur={() => onPoint(false)}
    >
      <span className="rung-names">
        <span>{nameOf(scene, finding.between[0])}, </span>
        <span>{nameOf(scene, finding.between[1])}</span>
      </span>
      <Reading finding={finding} form={form === 'pair' ? 'stacked' : form === 'dense' ? 'short' : 'line'} />
      {isPinned && (
        <span className="rung-deeper" role="img" aria-label="deeper than the rule shows">
          {'\u2193'}
        </span>
      )}
    </button>
  );
}
