// Where the selected part or group stands, and how it is turned.
import type { Scene, Vec3 } from '#shared/scene';
import { AngleField } from '../../../components/angle-field';
import { Menu, MenuItem } from '../../../components/menu';
import { useBench, useFacts, useOpen, useSession, useShown } from '../bench-model';
import { checked, labelOf, setCoordinate, setTurnInCar, turnInCar, zeroPoint } from '../edits';
import { sayStep, stepFor, stepsFor } from '../steps';
import { datumCoordinate, datumFor, datumsOf, readingFrom, type Axis } from './datums';
import { PlaceRow } from './place-row';
import { useMoved } from './use-moved';

const ACROSS_UP_ALONG: readonly Axis[] = [1, 0, 2];

export function PlacePanel() {
  const { open } = useBench();
  const scene = useShown();
  const canEdit = useOpen((o) => o.canEdit);
  const moved = useMoved();
  const { display } = useFacts();
  const chosen = useSession((s) => s.step);
  const datumKeys = useSession((s) => s.datums);
  const set = useSession((s) => s.set);
  const step = stepFor(display, chosen);
  const at = zeroPoint(scene, moved);
  const apply = (change: (s: Scene) => Scene): void =>
    open.getState().apply(checked(labelOf('Move', open.getState().scene, moved), change));
  return (
    <div className="tape-place">
      {ACROSS_UP_ALONG.map((axis) => {
        const datums = datumsOf(scene, axis);
        const datum = datumFor(scene, axis, datumKeys[axis]);
        return (
          <PlaceRow
            key={axis}
            axis={axis}
            datums={datums}
            datum={datum}
            reading={readingFrom(datum, axis, at)}
            step={step}
            disabled={!canEdit}
            onRead={(reading) =>
              apply((s) => setCoordinate(s, moved, axis, datumCoordinate(datum, axis, zeroPoint(s, moved)) + reading))
            }
            onDatum={(key) => set({ datums: { ...datumKeys, [axis]: key } })}
          />
        );
      })}
      {canEdit && <StepChoice />}
      {moved.parts.length === 1 || moved.group !== null ? <TurnRow /> : null}
    </div>
  );
}

function StepChoice() {
  const { session } = useBench();
  const { display } = useFacts();
  const step = stepFor(
    display,
    useSession((s) => s.step),
  );
  return (
    <p className="tape-step">
      <Menu
        align="start"
        trigger={
          <button type="button" className="place-datum" aria-label={`Step ${sayStep(step, display)}; choose another`}>
            step {sayStep(step, display)}
          </button>
        }
      >
        {stepsFor(display).map((mm) => (
          <MenuItem key={mm} onSelect={() => session.getState().set({ step: mm })}>
            {sayStep(mm, display)}
          </MenuItem>
        ))}
      </Menu>
      <span>arrow keys, Page Up and Page Down go by it too</span>
    </p>
  );
}

const TURNS = [
  { axis: 0, label: 'lean', about: 'about a line along the car' },
  { axis: 1, label: 'tip', about: 'about a line across the car' },
  { axis: 2, label: 'plan', about: 'about an upright line' },
] as const;

function TurnRow() {
  const { open } = useBench();
  const scene = useShown();
  const canEdit = useOpen((o) => o.canEdit);
  const moved = useMoved();
  const angles = turnInCar(scene, moved);
  const commit = (axis: number, degrees: number): void => {
    const next = angles.map((a, k) => (k === axis ? degrees : a)) as unknown as Vec3;
    open.getState().apply(checked(labelOf('Turn', open.getState().scene, moved), (s) => setTurnInCar(s, moved, next)));
  };
  return (
    <fieldset className="tape-turn">
      <legend>turned</legend>
      {TURNS.map(({ axis, label, about }) => (
        <div key={axis} title={about}>
          <AngleField
            label={label}
            look="measure"
            value={angles[axis]}
            step={0.5}
            disabled={!canEdit}
            onCommit={(degrees) => commit(axis, degrees)}
          />
        </div>
      ))}
    </fieldset>
  );
}
