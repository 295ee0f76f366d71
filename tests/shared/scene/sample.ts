// The example of the document's page, with the components that its rules name.

/** A fresh copy each time, so that a test may spoil it. */
export function sampleDocument(): Record<string, unknown> {
  return {
    format: 'gapwright-scene',
    version: 1,
    name: 'Layout 3',
    display: 'in',
    lasers: [{ id: 'column-line', name: 'Column line', point: [0, 352, 0], normal: [0, 1, 0] }],
    groups: [{ id: 'pedal-box', name: 'Pedal box', pose: { at: [40, 440, 560], turn: [0, -9, 0] } }],
    components: [
      {
        id: 'brake-pedal',
        name: 'Brake pedal',
        category: 'pedal',
        group: 'pedal-box',
        pose: {},
        tolerance: 2,
        source: 'measured',
        recipe: { kind: 'hanging-pedal', params: { arm: 240, hand: 'left', pad: true } },
        solids: [
          { id: 'arm', shape: { kind: 'box', size: [20, 12, 240] }, pose: { at: [0, 0, -120] } },
          { id: 'pad', shape: { kind: 'mesh', mesh: 'pad.stl', scale: 25.4 }, pose: { at: [0, 0, -250] } },
        ],
        motions: [
          {
            id: 'stroke',
            name: 'Brake stroke',
            use: 'operating',
            steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: 21 }],
          },
        ],
        holes: [{ id: 'b1', at: [0, 40, 0], axis: [1, 0, 0], diameter: 8.5 }],
      },
      {
        id: 'pedal-bracket',
        name: 'Pedal bracket',
        category: 'bracket',
        group: 'pedal-box',
        note: 'Two plates of 3 mm.',
        solids: [{ id: 'tube', shape: { kind: 'cylinder', diameter: 30, length: 80 }, pose: { turn: [90, 0, 0] } }],
        motions: [
          {
            id: 'draw-out',
            name: 'Draw-out',
            use: 'service',
            solids: ['tube'],
            steps: [
              { kind: 'slide', along: [1, 0, 0], to: 60 },
              { kind: 'swing', point: [0, 0, 0], axis: [0, 0, 1], to: 30 },
            ],
          },
        ],
      },
      {
        id: 'firewall',
        name: 'Firewall',
        category: 'firewall',
        solids: [{ id: 'sheet', shape: { kind: 'box', size: [1.2, 1200, 600] } }],
      },
    ],
    rules: {
      gap: 6,
      movingGap: 10,
      touch: 0.01,
      pairs: [
        { between: [{ component: 'brake-pedal' }, { category: 'column' }], gap: 8 },
        { between: [{ component: 'pedal-bracket' }, { component: 'firewall' }], joint: { allow: 1 } },
        { between: [{ group: 'pedal-box' }, { group: 'pedal-box' }], gap: 3 },
      ],
    },
    accuracy: 0.05,
  };
}

/**
 * A copy of `document` in which the value at `path` (`components[0].pose.at[1]`) is another; undefined takes the key out,
 * and the place one past a list's end adds to it.
 */
export function spoiled(document: Record<string, unknown>, path: string, value: unknown): Record<string, unknown> {
  const copy = structuredClone(document);
  const keys = path.split(/[.[\]]+/).filter((key) => key !== '');
  const last = keys.pop()!;
  const holder = keys.reduce<unknown>((inner, key) => (inner as Record<string, unknown>)[key], copy);
  if (value === undefined) delete (holder as Record<string, unknown>)[last];
  else {
    Object.defineProperty(holder, last, { value, enumerable: true, writable: true, configurable: true });
  }
  return copy;
}
