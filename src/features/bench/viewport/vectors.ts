// Small vector work on plain triples. Frames are the caller's.
export type Triple = readonly [number, number, number];

export const add = (a: Triple, b: Triple): Triple => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const sub = (a: Triple, b: Triple): Triple => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const scale = (a: Triple, k: number): Triple => [a[0] * k, a[1] * k, a[2] * k];
export const dot = (a: Triple, b: Triple): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a: Triple, b: Triple): Triple => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const length = (a: Triple): number => Math.hypot(a[0], a[1], a[2]);
export const mix = (a: Triple, b: Triple, t: number): Triple => add(a, scale(sub(b, a), t));

/** Zero stays zero. */
export function unit(a: Triple): Triple {
  const size = length(a);
  return size === 0 ? a : scale(a, 1 / size);
}

export interface Box {
  readonly low: Triple;
  readonly high: Triple;
}

export const centreOf = (box: Box): Triple => mix(box.low, box.high, 0.5);
export const sizeOf = (box: Box): Triple => sub(box.high, box.low);

export function joinBoxes(boxes: readonly Box[]): Box | null {
  const first = boxes[0];
  if (first === undefined) return null;
  const pick = (by: (...xs: number[]) => number, of: 'low' | 'high'): Triple => [
    by(...boxes.map((b) => b[of][0])),
    by(...boxes.map((b) => b[of][1])),
    by(...boxes.map((b) => b[of][2])),
  ];
  return { low: pick(Math.min, 'low'), high: pick(Math.max, 'high') };
}

export const cornersOf = ({ low, high }: Box): Triple[] =>
  [0, 1, 2, 3, 4, 5, 6, 7].map((k): Triple => [
    k & 1 ? high[0] : low[0],
    k & 2 ? high[1] : low[1],
    k & 4 ? high[2] : low[2],
  ]);
