// What something looks like: a surface to fill and lines to scribe.

export interface Surface {
  readonly positions: Float32Array;
  readonly normals: Float32Array;
  readonly index: Uint32Array;
}

/**
 * Lines, six numbers a line for its ends and six for the normals of the two faces beside it. A line with zero normals is
 * always drawn; the others only where they are the outline, with one face towards the eye and one away.
 */
export interface Scribe {
  readonly ends: Float32Array;
  readonly normals: Float32Array;
  /** How large the thing is that a line belongs to, mm, one number a line: lines of what is small on the screen fade. */
  readonly extents: Float32Array;
}

export interface Drawn {
  readonly surface: Surface;
  readonly scribe: Scribe;
  /** Whether its surface is closed, so that its inside never shows. */
  readonly closed: boolean;
}
