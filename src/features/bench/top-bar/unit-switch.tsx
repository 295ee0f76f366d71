// The unit that this person reads in.
import type { LengthDisplay } from '#shared/units';
import { Menu, MenuItem, MenuLabel } from '../../../components/menu';
import { useFacts } from '../bench-model';

const UNITS: readonly { readonly value: LengthDisplay; readonly short: string; readonly label: string }[] = [
  { value: 'in', short: 'in', label: 'Inches and fractions' },
  { value: 'in-decimal', short: '.in', label: 'Inches with decimals' },
  { value: 'mm', short: 'mm', label: 'Millimetres' },
];

export function UnitSwitch() {
  const { display, setDisplay } = useFacts();
  const current = UNITS.find((u) => u.value === display) ?? UNITS[0]!;
  return (
    <Menu
      trigger={
        <button type="button" className="unit-switch" aria-label={`Unit: ${current.label}`}>
          {current.short}
        </button>
      }
    >
      <MenuLabel>You read lengths in</MenuLabel>
      {UNITS.map((unit) => (
        <MenuItem key={unit.value} onSelect={() => setDisplay(unit.value)}>
          <span aria-hidden="true" className="inline-block w-4">
            {unit.value === display ? '\u2713' : ''}
          </span>
          {unit.label}
          {unit.value === display && <span className="sr-only">, chosen</span>}
        </MenuItem>
      ))}
    </Menu>
  );
}
