// The product's colours for drawing in WebGL and on a canvas, read from its tokens.
import { Color } from 'three';

const kept = new Map<string, Color>();

/** The CSS text of a token. */
export function tokenText(name: string): string {
  return getComputedStyle(document.documentElement).getPropertyValue(`--${name}`).trim();
}

/** A token's colour; do not change what is returned. */
export function tokenColour(name: string): Color {
  let colour = kept.get(name);
  if (colour === undefined) {
    colour = new Color(tokenText(name));
    kept.set(name, colour);
  }
  return colour;
}
