// The report of one check, as it is written to a file, stored with a revision and shown on the page.

export const ENGINE_VERSION = '1.0.0';

export type Verdict = 'hits' | 'tight' | 'loose' | 'seated' | 'clears';
/** In the order in which a report lists its findings: worst first. */
export const VERDICTS: readonly Verdict[] = ['hits', 'tight', 'loose', 'seated', 'clears'];

/** Which kind of rule decided the pair, most specific first. */
export type RuleKind =
  | 'joint'
  | 'component-component'
  | 'component-group'
  | 'component-category'
  | 'group-group'
  | 'group-category'
  | 'category-category'
  | 'movingGap'
  | 'gap';

export type Point = readonly [number, number, number];
/** A stretch of a motion, as positions 0 to 1. */
export type Span = readonly [number, number];

export interface MotionRef {
  readonly component: string;
  readonly motion: string;
}

export interface Overlap {
  /** mm³ that the bodies of the two sides share; null where a sheet is involved or it was not computed. */
  readonly volume: number | null;
  /** A translation of the first of `between` (world frame, mm) that was verified to free the two. */
  readonly pushOut: { readonly vector: Point; readonly length: number };
}

export interface Finding {
  readonly between: readonly [string, string];
  readonly motions: readonly MotionRef[];
  readonly verdict: Verdict;
  readonly required: number;
  readonly rule: RuleKind;
  readonly gap: number;
  readonly gapAtLeast: number;
  readonly margin: number;
  readonly at: {
    readonly positions: readonly number[];
    readonly points: readonly [Point, Point];
    readonly solids: readonly [string, string];
  };
  readonly insideSheet?: true;
  readonly hitSpans: readonly Span[] | null;
  readonly tightSpans: readonly Span[] | null;
  readonly overlap: Overlap | null;
}

export interface MeshEntry {
  readonly mesh: string;
  readonly sha256: string;
  readonly kind: 'body' | 'sheet';
  readonly triangles: number;
  readonly badEdges: number;
}

export interface Report {
  readonly format: 'gapwright-report';
  readonly version: 1;
  readonly engine: string;
  readonly scene: { readonly name: string; readonly sha256: string };
  readonly accuracy: number;
  readonly meshes: readonly MeshEntry[];
  readonly totals: Readonly<Record<Verdict, number>>;
  readonly unchecked: readonly (readonly [string, string])[];
  readonly findings: readonly Finding[];
}
