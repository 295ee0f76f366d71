// How a motion goes: its name and use, and each of its steps.
import {
  edits,
  MAX_STEPS,
  type Component,
  type Motion,
  type SlideStep,
  type Step,
  type SwingStep,
} from '#shared/scene';
import { AngleField } from '../../../components/angle-field';
import { Button } from '../../../components/button';
import { LengthField } from '../../../components/length-field';
import { Select, TextField } from '../../../components/text-field';
import { useBench, useFacts, useOpen } from '../bench-model';
import { DirectionTriple, LengthTriple } from './triple-fields';

interface FieldsProps {
  readonly part: Component;
  readonly motion: Motion;
}

const LABELS = ['rearward', 'right', 'up'] as const;

export function MotionFields({ part, motion }: FieldsProps) {
  const { open } = useBench();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { apply } = open.getState();
  const change = (patch: Partial<Omit<Motion, 'id'>>): void =>
    apply(edits.changeMotion(scene, part.id, motion.id, patch));
  const setSteps = (steps: readonly Step[]): void => change({ steps });
  return (
    <details className="motion-fields">
      <summary>How it goes</summary>
      {part.recipe !== undefined && (
        <p className="tape-small">
          It comes from the part&rsquo;s measurements under Size. Changed here by hand, the part is no longer made from
          them.
        </p>
      )}
      <TextField
        key={motion.name}
        label="Called"
        defaultValue={motion.name}
        maxLength={120}
        disabled={!canEdit}
        onBlur={(event) => {
          const name = event.target.value.trim();
          if (name !== '' && name !== motion.name) change({ name });
        }}
      />
      <Select
        label="It happens"
        value={motion.use}
        disabled={!canEdit}
        onChange={(event) => change({ use: event.target.value === 'service' ? 'service' : 'operating' })}
      >
        <option value="operating">while driving</option>
        <option value="service">for fitting and removal</option>
      </Select>
      {motion.steps.map((step, i) => (
        <StepFields
          key={i}
          step={step}
          number={i}
          of={motion.steps.length}
          disabled={!canEdit}
          onChange={(next) => setSteps(motion.steps.map((s, k) => (k === i ? next : s)))}
          onRemove={() => setSteps(motion.steps.filter((_, k) => k !== i))}
        />
      ))}
      {canEdit && (
        <div className="tape-row-deeds">
          <Button
            size="small"
            disabled={motion.steps.length >= MAX_STEPS}
            onClick={() => setSteps([...motion.steps, { kind: 'slide', along: [-1, 0, 0], from: 0, to: 50 }])}
          >
            Then a slide
          </Button>
          <Button
            size="small"
            disabled={motion.steps.length >= MAX_STEPS}
            onClick={() =>
              setSteps([...motion.steps, { kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: 20 }])
            }
          >
            Then a swing
          </Button>
          <Button size="small" kind="danger" onClick={() => apply(edits.removeMotion(scene, part.id, motion.id))}>
            Take the motion away
          </Button>
        </div>
      )}
    </details>
  );
}

interface StepProps {
  readonly step: Step;
  readonly number: number;
  readonly of: number;
  readonly disabled: boolean;
  readonly onChange: (step: Step) => void;
  readonly onRemove: () => void;
}

function StepFields({ step, number, of, disabled, onChange, onRemove }: StepProps) {
  const which = of === 1 ? '' : `${number + 1}. `;
  return (
    <fieldset className="step-fields">
      <legend>{step.kind === 'swing' ? `${which}swing` : `${which}slide`}</legend>
      {step.kind === 'swing' ? (
        <SwingFields step={step} isFirst={number === 0} disabled={disabled} onChange={onChange} />
      ) : (
        <SlideFields step={step} isFirst={number === 0} disabled={disabled} onChange={onChange} />
      )}
      {of > 1 && !disabled && (
        <button type="button" className="button-text" onClick={onRemove}>
          take this step out
        </button>
      )}
    </fieldset>
  );
}

interface KindProps<T> {
  readonly step: T;
  readonly isFirst: boolean;
  readonly disabled: boolean;
  readonly onChange: (step: Step) => void;
}

function SwingFields({ step, isFirst, disabled, onChange }: KindProps<SwingStep>) {
  return (
    <>
      <LengthTriple
        legend="pivot, from the part's zero point"
        labels={LABELS}
        value={step.point}
        disabled={disabled}
        onCommit={(point) => onChange({ ...step, point })}
      />
      <DirectionTriple
        legend="axis of the swing"
        labels={LABELS}
        value={step.axis}
        disabled={disabled}
        onCommit={(axis) => onChange({ ...step, axis })}
      />
      <div className="pair">
        {isFirst && (
          <AngleField
            label="from"
            value={step.from}
            disabled={disabled}
            onCommit={(from) => onChange({ ...step, from })}
          />
        )}
        <AngleField label="to" value={step.to} disabled={disabled} onCommit={(to) => onChange({ ...step, to })} />
      </div>
    </>
  );
}

function SlideFields({ step, isFirst, disabled, onChange }: KindProps<SlideStep>) {
  const { display } = useFacts();
  return (
    <>
      <DirectionTriple
        legend="direction of the slide"
        labels={LABELS}
        value={step.along}
        disabled={disabled}
        onCommit={(along) => onChange({ ...step, along })}
      />
      <div className="pair">
        {isFirst && (
          <LengthField
            label="from"
            display={display}
            signed="absolute"
            value={step.from}
            disabled={disabled}
            onCommit={(from) => onChange({ ...step, from })}
          />
        )}
        <LengthField
          label="to"
          display={display}
          signed="absolute"
          value={step.to}
          disabled={disabled}
          onCommit={(to) => onChange({ ...step, to })}
        />
      </div>
    </>
  );
}
