// The fields of a recipe's measurements, each with where its usual figure comes from.
import type { Fault, Param, Params, PartRecipe } from '#shared/parts';
import { AngleField } from '../../../components/angle-field';
import { LengthField } from '../../../components/length-field';
import { Select } from '../../../components/text-field';
import { NumberBox } from '../tape/triple-fields';
import { useFacts } from '../bench-model';

export interface ParamFieldsProps {
  readonly recipe: PartRecipe;
  readonly params: Params;
  readonly faults: readonly Fault[];
  readonly disabled: boolean;
  readonly onChange: (key: string, value: number | string) => void;
  /** Rows with the figure beside its name, as on the tape. */
  readonly compact?: boolean;
}

export function ParamFields({ recipe, params, faults, disabled, onChange, compact = false }: ParamFieldsProps) {
  const known = new Set(recipe.params.map((p) => p.key));
  return (
    <div className={compact ? 'params params-compact' : 'params'}>
      {recipe.params.map((param) => (
        <ParamField
          key={param.key}
          param={param}
          value={params[param.key] ?? param.default}
          error={faults.find((f) => f.key === param.key)?.message ?? null}
          disabled={disabled}
          look={compact ? 'measure' : 'form'}
          onChange={(value) => onChange(param.key, value)}
        />
      ))}
      {faults
        .filter((f) => !known.has(f.key))
        .map((f) => (
          <p key={f.message} role="alert" className="text-sm font-semibold text-hits">
            {f.message}
          </p>
        ))}
    </div>
  );
}

interface ParamFieldProps {
  readonly param: Param;
  readonly value: number | string;
  readonly error: string | null;
  readonly disabled: boolean;
  readonly look: 'form' | 'measure';
  readonly onChange: (value: number | string) => void;
}

function ParamField({ param, value, error, disabled, look, onChange }: ParamFieldProps) {
  const { display } = useFacts();
  const hint = `${param.help} ${param.origin === 'drawn by eye, no source' ? 'Drawn by eye.' : sentence(param.origin)}`;
  if (param.unit === 'choice') {
    return (
      <Select
        label={param.label}
        value={value}
        disabled={disabled}
        error={error}
        hint={param.help}
        onChange={(event) => onChange(event.target.value)}
      >
        {param.choices.map((c) => (
          <option key={c.value} value={c.value}>
            {c.label}
          </option>
        ))}
      </Select>
    );
  }
  const number = Number(value);
  const shared = { label: param.label, value: number, disabled, error, hint, look };
  if (param.unit === 'angle') return <AngleField {...shared} least={param.min} most={param.max} onCommit={onChange} />;
  if (param.unit === 'count') {
    return <NumberBox label={param.label} value={number} disabled={disabled} onCommit={onChange} />;
  }
  return <LengthField {...shared} display={display} least={param.min} most={param.max} onCommit={onChange} />;
}

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
