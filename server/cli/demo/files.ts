// All files of the demo, as they lie in assets/demo.
import { DEMO_MESHES } from './meshes';
import { DEMO_PROJECT, DEMO_SCENES } from './scenes';

const text = (value: unknown): Uint8Array => new TextEncoder().encode(`${JSON.stringify(value, null, 1)}\n`);

export function demoFiles(): Map<string, Uint8Array> {
  return new Map([
    ['demo.json', text(DEMO_PROJECT)],
    ...Object.entries(DEMO_MESHES).map(([name, make]) => [name, make()] as const),
    ...Object.entries(DEMO_SCENES).map(([name, make]) => [name, text(make())] as const),
  ]);
}
