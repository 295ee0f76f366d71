import { meshUnits, type MeshLine, type MeshUnit } from '#shared/api';
import type { LengthDisplay } from '#shared/units';
import { Choice } from '../../components/choice';
import { MeshSize } from './mesh-size';

const UNIT_NAME: Readonly<Record<MeshUnit, string>> = {
  mm: 'millimetres',
  cm: 'centimetres',
  m: 'metres',
  in: 'inches',
  ft: 'feet',
};

export const unitName = (unit: MeshUnit): string => UNIT_NAME[unit];

export interface UnitChoiceProps {
  readonly mesh: MeshLine;
  readonly value: MeshUnit;
  readonly display: LengthDisplay;
  readonly onChange: (unit: MeshUnit) => void;
}

/** The unit of a file, told by the size that each would give. */
export const UnitChoice = ({ mesh, value, display, onChange }: UnitChoiceProps) => (
  <Choice<MeshUnit>
    legend="In which unit was it drawn? Then it measures"
    name="unit"
    value={value}
    onChange={onChange}
    options={meshUnits.map((unit) => ({
      value: unit,
      label: (
        <>
          {unitName(unit)}: <MeshSize mesh={mesh} unit={unit} display={display} />
          {unit === mesh.guess && <span className="text-sm text-soft"> (looks likely)</span>}
        </>
      ),
    }))}
  />
);
