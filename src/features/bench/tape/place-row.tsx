// One reading of the tape: "4 1/8 right of column line", to be read, typed over, or nudged.
import { inWords } from '../../../lib/part-words';
import { IconButton } from '../../../components/icon-button';
import { LengthField } from '../../../components/length-field';
import { Menu, MenuItem, MenuLabel, MenuRule } from '../../../components/menu';
import { useFacts, useSession } from '../bench-model';
import { sayStep } from '../steps';
import { SIDES, type Axis, type Datum } from './datums';

export interface PlaceRowProps {
  readonly axis: Axis;
  readonly datums: readonly Datum[];
  readonly datum: Datum;
  /** mm from the datum along the axis. */
  readonly reading: number;
  readonly step: number;
  readonly disabled: boolean;
  readonly onRead: (reading: number) => void;
  readonly onDatum: (key: string) => void;
}

const WAYS: readonly (readonly [string, string])[] = [
  ['forward', 'rearward'],
  ['to the left', 'to the right'],
  ['down', 'up'],
];

export function PlaceRow({ axis, datums, datum, reading, step, disabled, onRead, onDatum }: PlaceRowProps) {
  const { display, words } = useFacts();
  const set = useSession((s) => s.set);
  const isOn = Math.abs(reading) < 0.005;
  const side = reading < 0 ? -1 : 1;
  const [plus, minus] = SIDES[axis]!;
  const place = isOn ? 'on' : side > 0 ? plus : minus;
  const name = inWords(datum.name.charAt(0).toLowerCase() + datum.name.slice(1), words);
  return (
    <div
      className="place-row"
      onFocus={() => set({ measuredAxis: axis })}
      onBlur={() => set({ measuredAxis: null })}
      onPointerEnter={() => set({ measuredAxis: axis })}
      onPointerLeave={() => set({ measuredAxis: null })}
    >
      <span className="place-words">
        {place}{' '}
        {datums.length > 1 || !disabled ? (
          <Menu
            align="start"
            trigger={
              <button type="button" className="place-datum" aria-label={`Read off ${name}; choose another`}>
                {name}
              </button>
            }
          >
            <MenuLabel>Read it off</MenuLabel>
            {datums.map((d) => (
              <MenuItem key={d.key} onSelect={() => onDatum(d.key)}>
                {inWords(d.name, words)}
              </MenuItem>
            ))}
            <MenuRule />
            <MenuItem onSelect={() => set({ sheet: 'lasers' })}>The lasers of this scene</MenuItem>
          </Menu>
        ) : (
          name
        )}
      </span>
      {!disabled && (
        <IconButton
          label={`${sayStep(step, display)} ${WAYS[axis]![0]}`}
          className="place-nudge"
          onClick={() => onRead(reading - step)}
        >
          {'\u2212'}
        </IconButton>
      )}
      <LengthField
        label={`${place} ${name}`}
        labelHidden
        look="measure"
        display={display}
        step={step}
        value={Math.abs(reading)}
        disabled={disabled}
        onCommit={(mm) => onRead(side * mm)}
      />
      {!disabled && (
        <IconButton
          label={`${sayStep(step, display)} ${WAYS[axis]![1]}`}
          className="place-nudge"
          onClick={() => onRead(reading + step)}
        >
          +
        </IconButton>
      )}
    </div>
  );
}
