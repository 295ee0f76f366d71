// Loose triangles, as a file gives them, before their corners are shared.

/** The corners of n triangles in file units, nine numbers a triangle, all finite, no negative zero. */
export type TriangleSoup = Float32Array | Float64Array;

export type StlResult =
  | { readonly ok: true; readonly soup: TriangleSoup; readonly form: 'binary' | 'text' }
  | { readonly ok: false; readonly reason: string };
