// What a ready-made part is: a recipe that turns a handful of measurements into solids, motions and holes. It is a block to
// start with, never a maker's drawing.
import type { Category, Hole, Motion, Solid } from '#shared/scene';

/** Where a figure comes from. None of them is an outside check; the person sees it beside the field. */
export type Origin = 'common practice, no source' | 'from memory' | 'drawn by eye, no source';

interface ParamBase {
  readonly key: string;
  readonly label: string;
  readonly help: string;
  readonly origin: Origin;
}
/** Lengths in mm, angles in degrees; a count is a whole number. */
export interface NumberParam extends ParamBase {
  readonly unit: 'length' | 'angle' | 'count';
  readonly default: number;
  readonly min: number;
  readonly max: number;
}
export interface ChoiceParam extends ParamBase {
  readonly unit: 'choice';
  readonly default: string;
  readonly choices: readonly { readonly value: string; readonly label: string }[];
}
export type Param = NumberParam | ChoiceParam;
export type Params = Readonly<Record<string, number | string>>;

/** The part in its own frame: vehicle axes (+X rearward, +Y to the right, +Z up), mm and degrees. */
export interface Built {
  readonly solids: readonly Solid[];
  readonly motions: readonly Motion[];
  readonly holes: readonly Hole[];
}

/** What is wrong with one parameter, as a sentence. */
export interface Fault {
  readonly key: string;
  readonly message: string;
}

export type ParamsResult =
  | { readonly ok: true; readonly params: Params }
  | { readonly ok: false; readonly faults: readonly [Fault, ...Fault[]] };
export type BuildResult =
  | { readonly ok: true; readonly part: Built; readonly params: Params }
  | { readonly ok: false; readonly faults: readonly [Fault, ...Fault[]] };

/** Something that follows from the parameters and that the person wants to read, such as a pedal's ratio. */
export interface Fact {
  readonly key: string;
  readonly label: string;
  readonly unit: 'length' | 'angle' | 'ratio' | 'share';
  readonly value: number;
}

export interface PartRecipe {
  readonly kind: string;
  readonly name: string;
  /** The UK's word where it is another one. */
  readonly ukName: string;
  readonly category: Category;
  /** One sentence for the shelf. */
  readonly about: string;
  /** Where the part's origin is, and which way it looks. */
  readonly frame: string;
  /** From where its picture shows most of it. */
  readonly seenFrom: 'ahead' | 'behind';
  readonly params: readonly Param[];
  /** Fills in defaults and judges; lengths in the sentences are millimetres. */
  readonly check: (params: unknown) => ParamsResult;
  readonly build: (params: unknown) => BuildResult;
  /** Empty where the parameters are at fault. */
  readonly facts: (params: unknown) => readonly Fact[];
}
