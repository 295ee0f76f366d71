// The scene document as the rest of the code sees it: every default filled in, every id checked.
// Frame: vehicle axes as in ISO 4130 (+X rearward, +Y to the car's right, +Z up). Units: millimetres and degrees.

export type Vec3 = readonly [number, number, number];

/** Rotation Rx(rx)·Ry(ry)·Rz(rz) in degrees, then translation in mm. A missing half is zero. */
export interface Pose {
  readonly at?: Vec3;
  readonly turn?: Vec3;
}

export type Display = 'mm' | 'in' | 'in-decimal';

export const CATEGORIES = [
  'firewall',
  'cowl',
  'toe-board',
  'floor',
  'tunnel',
  'inner-fender',
  'fender-liner',
  'hood',
  'dash',
  'column',
  'pedal',
  'pedal-box',
  'master-cylinder',
  'reservoir',
  'booster',
  'throttle',
  'wiper',
  'heater',
  'engine',
  'exhaust',
  'belt',
  'line',
  'hose',
  'wiring',
  'seat',
  'driver',
  'bracket',
  'other',
] as const;
export type Category = (typeof CATEGORIES)[number];

export const SOURCES = ['measured', 'sheet', 'guess'] as const;
export type Source = (typeof SOURCES)[number];

export interface BoxShape {
  readonly kind: 'box';
  readonly size: Vec3;
}
export interface CylinderShape {
  readonly kind: 'cylinder';
  readonly diameter: number;
  readonly length: number;
}
/** `mesh` is a path beside the document in a bundle or on the command line, a SHA-256 in the database. */
export interface MeshShape {
  readonly kind: 'mesh';
  readonly mesh: string;
  readonly scale: number;
}
export type Shape = BoxShape | CylinderShape | MeshShape;

export interface Solid {
  readonly id: string;
  readonly name?: string;
  readonly shape: Shape;
  readonly pose?: Pose;
}

export interface SwingStep {
  readonly kind: 'swing';
  readonly point: Vec3;
  readonly axis: Vec3;
  readonly from: number;
  readonly to: number;
}
export interface SlideStep {
  readonly kind: 'slide';
  readonly along: Vec3;
  readonly from: number;
  readonly to: number;
}
export type Step = SwingStep | SlideStep;

export interface Motion {
  readonly id: string;
  readonly name: string;
  readonly use: 'operating' | 'service';
  /** Solids of the component that move; left out: all of them. */
  readonly solids?: readonly string[];
  readonly steps: readonly Step[];
}

export interface Hole {
  readonly id: string;
  readonly at: Vec3;
  readonly axis: Vec3;
  readonly diameter: number;
}

export interface Recipe {
  readonly kind: string;
  readonly params: Readonly<Record<string, number | string | boolean>>;
}

export interface Component {
  readonly id: string;
  readonly name: string;
  readonly category: Category;
  readonly group?: string;
  readonly pose: Pose;
  readonly tolerance: number;
  readonly source?: Source;
  readonly note?: string;
  readonly recipe?: Recipe;
  readonly solids: readonly Solid[];
  readonly motions: readonly Motion[];
  readonly holes: readonly Hole[];
}

export interface Laser {
  readonly id: string;
  readonly name: string;
  readonly point: Vec3;
  readonly normal: Vec3;
}

export interface Group {
  readonly id: string;
  readonly name: string;
  readonly pose: Pose;
}

export type Side = { readonly component: string } | { readonly group: string } | { readonly category: Category };

export interface PairRule {
  readonly between: readonly [Side, Side];
  readonly gap?: number;
  readonly joint?: { readonly allow: number };
}

export interface Rules {
  readonly gap: number;
  readonly movingGap: number;
  readonly touch: number;
  readonly pairs: readonly PairRule[];
}

export interface Scene {
  readonly format: 'gapwright-scene';
  readonly version: 1;
  readonly name: string;
  readonly display: Display;
  readonly lasers: readonly Laser[];
  readonly groups: readonly Group[];
  readonly components: readonly Component[];
  readonly rules: Rules;
  readonly accuracy: number;
}
