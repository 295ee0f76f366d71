/** Whether this browser can draw the scene. Asked once. */
let known: boolean | null = null;

export function hasWebGl2(): boolean {
  if (known === null) {
    const context = document.createElement('canvas').getContext('webgl2');
    known = context !== null;
    // contexts are few: this one is given back at once
    context?.getExtension('WEBGL_lose_context')?.loseContext();
  }
  return known;
}

export const isCalm = (): boolean => window.matchMedia('(prefers-reduced-motion: reduce)').matches;
