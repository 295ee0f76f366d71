// How recipes are written down: parameters with their limits, judged in one place, so that a recipe's own code only ever
// sees values that it can build.
import { formatAngle, formatLength } from '#shared/units';
import type { Category } from '#shared/scene';
import type { Built, ChoiceParam, Fact, Fault, NumberParam, Origin, Param, PartRecipe } from './types';

export const PRACTICE: Origin = 'common practice, no source';
export const MEMORY: Origin = 'from memory';
export const BY_EYE: Origin = 'drawn by eye, no source';

type NumberSpec = Omit<NumberParam, 'key'>;
interface ChoiceSpec<C extends string> extends Omit<ChoiceParam, 'key'> {
  readonly default: C;
  readonly choices: readonly { readonly value: C; readonly label: string }[];
}
type Specs = Readonly<Record<string, NumberSpec | ChoiceSpec<string>>>;
/** A recipe's parameters after they were judged. */
export type Values<P extends Specs> = { readonly [K in keyof P]: P[K] extends ChoiceSpec<infer C> ? C : number };

type Limits = readonly [least: number, start: number, most: number];

const numberSpec =
  (unit: NumberSpec['unit']) =>
  (label: string, [min, start, max]: Limits, help: string, origin: Origin): NumberSpec => ({
    unit,
    label,
    min,
    default: start,
    max,
    help,
    origin,
  });
/** Limits are [least, start, most] in mm. */
export const length = numberSpec('length');
/** Limits are [least, start, most] in degrees. */
export const angle = numberSpec('angle');
export const count = numberSpec('count');

export function choice<C extends string>(
  label: string,
  choices: Readonly<Record<C, string>>,
  start: NoInfer<C>,
  help: string,
): ChoiceSpec<C> {
  const list = (Object.entries(choices) as [C, string][]).map(([value, text]) => ({ value, label: text }));
  return { unit: 'choice', label, choices: list, default: start, help, origin: BY_EYE };
}

function printed(param: NumberParam, value: number): string {
  if (param.unit === 'length') return formatLength(value, 'mm', { decimals: 2 });
  return param.unit === 'angle' ? formatAngle(value, { decimals: 2 }) : `${value}`;
}

function faultOf(param: Param, value: unknown): string | null {
  if (param.unit === 'choice') {
    if (param.choices.some((c) => c.value === value)) return null;
    return `${param.label}: choose ${param.choices.map((c) => `“${c.value}”`).join(' or ')}.`;
  }
  if (typeof value !== 'number' || !Number.isFinite(value)) return `${param.label}: give a number.`;
  if (param.unit === 'count' && !Number.isInteger(value)) return `${param.label}: give a whole number.`;
  if (value >= param.min && value <= param.max) return null;
  const limits = `${printed(param, param.min)} to ${printed(param, param.max)}`;
  return `${param.label} is ${printed(param, value)}; this part can be built from ${limits}.`;
}

interface RecipeSpec<P extends Specs> {
  readonly kind: string;
  readonly name: string;
  readonly ukName?: string;
  readonly category: Category;
  readonly about: string;
  readonly frame: string;
  /** From where its picture shows most of it; from ahead if left out. */
  readonly seenFrom?: 'ahead' | 'behind';
  readonly params: P;
  /** What several parameters together make impossible; each alone is within its limits here. */
  readonly faults?: (p: Values<P>) => readonly Fault[];
  readonly build: (p: Values<P>) => Built;
  readonly facts?: (p: Values<P>) => readonly Fact[];
}

/** Judges parameters; missing ones get their defaults, so that a document made before a parameter existed builds again. */
function judge<P extends Specs>(
  spec: RecipeSpec<P>,
  params: readonly Param[],
  input: unknown,
): { readonly values: Values<P> } | { readonly faults: readonly [Fault, ...Fault[]] } {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) {
    return { faults: [{ key: '', message: `${spec.name}: the measurements must be given by name.` }] };
  }
  const given = input as Readonly<Record<string, unknown>>;
  const faults: Fault[] = [];
  for (const key of Object.keys(given)) {
    if (!params.some((p) => p.key === key)) {
      faults.push({ key, message: `${spec.name} has no measurement “${key}”; leave it out.` });
    }
  }
  const values: Record<string, unknown> = {};
  for (const param of params) {
    const value = Object.hasOwn(given, param.key) ? given[param.key] : param.default;
    const message = faultOf(param, value);
    if (message !== null) faults.push({ key: param.key, message });
    values[param.key] = value;
  }
  const judged = values as Values<P>;
  if (faults.length === 0) faults.push(...(spec.faults?.(judged) ?? []));
  const [first, ...rest] = faults;
  return first === undefined ? { values: judged } : { faults: [first, ...rest] };
}

export function defineRecipe<const P extends Specs>(spec: RecipeSpec<P>): PartRecipe {
  const params: Param[] = Object.entries(spec.params).map(([key, param]) => ({ key, ...param }));
  const { kind, name, category, about, frame } = spec;
  return {
    kind,
    name,
    ukName: spec.ukName ?? name,
    category,
    about,
    frame,
    seenFrom: spec.seenFrom ?? 'ahead',
    params,
    check: (input) => {
      const judged = judge(spec, params, input);
      return 'values' in judged ? { ok: true, params: judged.values } : { ok: false, faults: judged.faults };
    },
    build: (input) => {
      const judged = judge(spec, params, input);
      if (!('values' in judged)) return { ok: false, faults: judged.faults };
      return { ok: true, part: spec.build(judged.values), params: judged.values };
    },
    facts: (input) => {
      const judged = judge(spec, params, input);
      return 'values' in judged ? (spec.facts?.(judged.values) ?? []) : [];
    },
  };
}
