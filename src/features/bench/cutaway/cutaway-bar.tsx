// The controls of the cutaway, while one hangs.
import { IconButton } from '../../../components/icon-button';
import { LengthField } from '../../../components/length-field';
import { CrossMark } from '../../../components/pictograms';
import { Select } from '../../../components/text-field';
import { inWords } from '../../../lib/part-words';
import { useBench, useFacts, useOpen, useSession } from '../bench-model';
import { datumsOf, type Axis } from '../tape/datums';

const AXES: readonly (readonly [Axis, string])[] = [
  [1, 'across'],
  [0, 'along'],
  [2, 'level'],
];

export function CutawayBar() {
  const { session } = useBench();
  const { display, words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const cutOn = useSession((s) => s.cutOn);
  if (cutOn === null) return null;
  const { set } = session.getState();
  const value = `${cutOn.axis} ${cutOn.datum ?? datumsOf(scene, cutOn.axis)[0]!.key}`;
  return (
    <div className="cutaway" role="group" aria-label="Cutaway">
      <Select
        label="Cut away on"
        value={value}
        onChange={(event) => {
          const axis = Number(event.target.value[0]) as Axis;
          set({ cutOn: { ...cutOn, axis, datum: event.target.value.slice(2), offset: 0 } });
        }}
      >
        {AXES.map(([axis, name]) => (
          <optgroup key={axis} label={name}>
            {datumsOf(scene, axis).map((d) => (
              <option key={d.key} value={`${axis} ${d.key}`}>
                {inWords(d.name, words)}
              </option>
            ))}
          </optgroup>
        ))}
      </Select>
      <LengthField
        label="off it by"
        display={display}
        signed="absolute"
        value={cutOn.offset}
        onCommit={(offset) => set({ cutOn: { ...cutOn, offset } })}
      />
      <button
        type="button"
        className="button-text"
        onClick={() => set({ cutOn: { ...cutOn, isFlipped: !cutOn.isFlipped } })}
      >
        the other side
      </button>
      <IconButton label="Take the cutaway down" onClick={() => set({ cutOn: null })}>
        <CrossMark />
      </IconButton>
    </div>
  );
}
