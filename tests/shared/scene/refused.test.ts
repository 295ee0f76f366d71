import { describe, expect, it } from 'vitest';
import { loadScene, loadSceneText } from '#shared/scene';
import { sampleDocument, spoiled } from './sample';

const swing = (to: number, from?: number): unknown => ({
  kind: 'swing',
  point: [0, 0, 0],
  axis: [0, 1, 0],
  to,
  ...(from === undefined ? {} : { from }),
});
const slide = (to: number, from?: number): unknown => ({
  kind: 'slide',
  along: [1, 0, 0],
  to,
  ...(from === undefined ? {} : { from }),
});
const motion = (id: string, use: string, extra: object): unknown => ({
  id,
  name: id,
  use,
  steps: [swing(10)],
  ...extra,
});
const solid0 = 'components[0].solids[0]';
const motion0 = 'components[0].motions[0]';
const step0 = `${motion0}.steps[0]`;
const pair0 = 'rules.pairs[0]';
const categories = `"firewall", "cowl", "toe-board", "floor", "tunnel", "inner-fender", "fender-liner", "hood", "dash", "column", "pedal", "pedal-box", "master-cylinder", "reservoir", "booster", "throttle", "wiper", "heater", "engine", "exhaust", "belt", "line", "hose", "wiring", "seat", "driver", "bracket", "other"`;

/** Where the sample is spoiled, with what; then the refusal: its reason, and its path where it is another. */
const CASES: readonly (readonly [path: string, value: unknown, reason: string, at?: string])[] = [
  // what is needed
  ['format', undefined, 'is missing'],
  ['format', 'other-scene', 'must be "gapwright-scene"'],
  ['version', undefined, 'is missing'],
  ['name', undefined, 'is missing'],
  ['components', undefined, 'is missing'],
  ['components[1].id', undefined, 'is missing'],
  ['components[1].name', undefined, 'is missing'],
  ['components[1].category', undefined, 'is missing'],
  ['components[1].solids', undefined, 'is missing'],
  [`${solid0}.id`, undefined, 'is missing'],
  [`${solid0}.shape`, undefined, 'is missing', `${solid0}.shape`],
  [`${solid0}.shape.kind`, undefined, 'is missing'],
  [`${solid0}.shape.size`, undefined, 'is missing'],
  [`${motion0}.use`, undefined, 'is missing'],
  [`${motion0}.steps`, undefined, 'is missing'],
  [`${step0}.point`, undefined, 'is missing'],
  [`${step0}.axis`, undefined, 'is missing'],
  [`${step0}.to`, undefined, 'is missing'],
  ['components[1].motions[0].steps[0].along', undefined, 'is missing'],
  [`${pair0}.between`, undefined, 'is missing'],
  [`${pair0}.gap`, undefined, 'needs one of gap and joint', pair0],

  // versions
  ['version', 2, '2 is newer than this program reads (1): use a newer one'],
  ['version', '2', 'must be the number 1'],
  ['version', '1', 'must be the number 1'],
  ['version', 0, 'must be the number 1'],
  ['version', 1.5, 'must be the number 1'],
  ['version', null, 'must be the number 1'],

  // unknown keys and words
  ['colour', 'red', 'is not known'],
  ['components[2].colour', 'red', 'is not known'],
  [`${solid0}.shape.radius`, 4, 'is not known'],
  [`${solid0}.pose.scale`, 2, 'is not known'],
  ['rules.speed', 1, 'is not known'],
  [`${pair0}.origin`, 'yours', 'is not known'],
  [`${pair0}.between[0].side`, 'left', 'is not known'],
  ['components[0].recipe.by', 'me', 'is not known'],
  ['components[0].__proto__', {}, 'is not known'],
  ['components[0].recipe.params.__proto__', 1, 'is not known'],
  ['constructor', 1, 'is not known'],
  ['two words', 1, 'is not known', '"two words"'],
  ['display', 'feet', 'must be one of "mm", "in", "in-decimal"'],
  ['components[0].category', 'pedals', `must be one of ${categories}`],
  ['components[0].source', 'hearsay', 'must be one of "measured", "sheet", "guess"'],
  [`${motion0}.use`, 'sometimes', 'must be one of "operating", "service"'],
  [`${solid0}.shape.kind`, 'ball', 'must be one of "box", "cylinder", "mesh"'],
  [`${step0}.kind`, 'hop', 'must be one of "swing", "slide"'],
  [`${pair0}.between[1].category`, 'columns', `must be one of ${categories}`],

  // ids and names
  ['components[0].id', 'Brake Pedal', 'must be 1 to 64 of a-z, 0-9 and -'],
  ['components[0].id', '', 'must be 1 to 64 of a-z, 0-9 and -'],
  ['components[0].id', 'a'.repeat(65), 'must be 1 to 64 of a-z, 0-9 and -'],
  ['components[0].id', 'a\n', 'must be 1 to 64 of a-z, 0-9 and -'],
  ['lasers[0].id', 'ä', 'must be 1 to 64 of a-z, 0-9 and -'],
  ['name', '', 'must have 1 to 120 characters'],
  ['name', '😀'.repeat(121), 'must have 1 to 120 characters'],
  ['components[0].name', 'x'.repeat(121), 'must have 1 to 120 characters'],
  ['components[0].name', 7, 'must be text'],
  ['components[0].name', 'a\0', 'must not hold NUL or half a character'],
  ['components[0].name', '\ud800', 'must not hold NUL or half a character'],
  ['components[1].note', 'x'.repeat(2001), 'must have at most 2000 characters'],

  // numbers
  [`${solid0}.shape.size[1]`, 0, 'must be greater than 0'],
  [`${solid0}.shape.size[1]`, -3, 'must be greater than 0'],
  [`${solid0}.shape.size[1]`, Infinity, 'must be a finite number'],
  [`${solid0}.shape.size[1]`, NaN, 'must be a finite number'],
  [`${solid0}.shape.size[1]`, '20', 'must be a finite number'],
  [`${solid0}.shape.size[1]`, null, 'must be a finite number'],
  [`${solid0}.shape.size`, [1, 2], 'must have at least 3 entries'],
  [`${solid0}.shape.size`, [1, 2, 3, 4], 'must have at most 3 entries'],
  [`${solid0}.shape.size`, 5, 'must be a list'],
  ['components[1].solids[0].shape.diameter', 0, 'must be greater than 0'],
  ['components[1].solids[0].shape.length', -1, 'must be greater than 0'],
  ['components[0].solids[1].shape.scale', 0, 'must be greater than 0'],
  ['components[0].holes[0].diameter', 0, 'must be greater than 0'],
  ['components[0].tolerance', -1, 'must be at least 0'],
  ['rules.gap', -1, 'must be at least 0'],
  ['rules.movingGap', -0.1, 'must be at least 0'],
  [`${pair0}.gap`, -8, 'must be at least 0'],
  ['rules.pairs[1].joint.allow', -1, 'must be at least 0'],
  ['rules.touch', 0, 'must be at least 0.0001'],
  ['rules.touch', 0.00009, 'must be at least 0.0001'],
  ['accuracy', 0, 'must be at least 0.0001'],
  ['accuracy', -1, 'must be at least 0.0001'],
  [`${step0}.axis`, [0, 0, 0], 'must not be zero'],
  [`${step0}.axis`, [0, -0, 0], 'must not be zero'],
  ['components[1].motions[0].steps[0].along', [0, 0, 0], 'must not be zero'],
  ['components[0].holes[0].axis', [0, 0, 0], 'must not be zero'],
  ['lasers[0].normal', [0, 0, 0], 'must not be zero'],

  // kinds of value
  ['components', {}, 'must be a list'],
  ['lasers', {}, 'must be a list'],
  ['rules', [], 'must be an object'],
  ['components[0]', [], 'must be an object'],
  ['components[0].pose', [0, 0, 0], 'must be an object'],
  ['components[0].solids[0].shape', 'box', 'must be an object'],
  ['components[0].recipe.params', [], 'must be an object'],
  ['components[0].recipe.params', undefined, 'is missing'],
  ['components[0].recipe.params.arm', [240], 'must be a finite number, text, true or false'],
  ['components[0].recipe.params.arm', 'x'.repeat(201), 'must have at most 200 characters'],

  // lists that must hold something
  ['components[2].solids', [], 'must not be empty'],
  [`${motion0}.steps`, [], 'must not be empty'],
  [`${motion0}.solids`, [], 'must not be empty'],

  // ids that exist, once
  ['components[0].group', 'pedal-boxes', 'there is no group "pedal-boxes"'],
  [`${motion0}.solids`, ['arm', 'leg'], 'there is no solid "leg" in this component', `${motion0}.solids[1]`],
  [`${motion0}.solids`, ['arm', 'arm'], '"arm" is named twice', `${motion0}.solids[1]`],
  [`${pair0}.between[0].component`, 'brake', 'there is no component "brake"'],
  ['rules.pairs[2].between[1].group', 'box', 'there is no group "box"'],
  [
    'lasers[1]',
    { id: 'column-line', name: 'x', point: [0, 0, 0], normal: [0, 0, 1] },
    '"column-line" is taken by lasers[0]',
    'lasers[1].id',
  ],
  ['groups[1]', { id: 'pedal-box', name: 'x' }, '"pedal-box" is taken by groups[0]', 'groups[1].id'],
  ['components[2].id', 'pedal-bracket', '"pedal-bracket" is taken by components[1]'],
  ['components[0].solids[1].id', 'arm', '"arm" is taken by components[0].solids[0]'],
  [
    'components[1].motions[1]',
    motion('draw-out', 'service', {}),
    '"draw-out" is taken by components[1].motions[0]',
    'components[1].motions[1].id',
  ],
  [
    'components[0].holes[1]',
    { id: 'b1', at: [0, 0, 0], axis: [1, 0, 0], diameter: 6 },
    '"b1" is taken by components[0].holes[0]',
    'components[0].holes[1].id',
  ],

  // motions
  [
    'components[0].motions[1]',
    motion('other', 'operating', {}),
    'solid "arm" is moved by components[0].motions[0] already: one operating motion a solid',
  ],
  [
    'components[0].motions[1]',
    motion('other', 'operating', { solids: ['pad'] }),
    'solid "pad" is moved by components[0].motions[0] already: one operating motion a solid',
    'components[0].motions[1].solids[0]',
  ],
  [`${motion0}.steps[1]`, swing(5, 1), 'belongs to the first step only', `${motion0}.steps[1].from`],
  [`${step0}.to`, 3600.5, "the motion's swings must stay within 3600 degrees together"],
  [
    `${motion0}.steps`,
    [swing(2000), slide(5), swing(-1700)],
    "the motion's swings must stay within 3600 degrees together",
    `${motion0}.steps[2].to`,
  ],
  [step0, slide(20_001), "the motion's slides must stay within 20 m together", `${step0}.to`],
  [step0, slide(25_000, 24_000), "the motion's slides must stay within 20 m together", `${step0}.to`],
  [step0, slide(15_000, -6000), "the motion's slides must stay within 20 m together", `${step0}.to`],
  [`${motion0}.steps`, Array.from({ length: 33 }, () => swing(1)), 'must have at most 32 entries'],
  [
    'components[0].motions',
    Array.from({ length: 17 }, (_, i) => motion(`m${i}`, 'service', {})),
    'must have at most 16 entries',
  ],

  // rules
  ['rules.pairs[1].gap', 3, 'has both gap and joint: only one is allowed', 'rules.pairs[1]'],
  ['rules.pairs[1].between[1]', { category: 'firewall' }, 'a joint names two components, never a group or category'],
  ['rules.pairs[1].between[0]', { group: 'pedal-box' }, 'a joint names two components, never a group or category'],
  [`${pair0}.between[1]`, { component: 'brake-pedal' }, 'is the same component twice', `${pair0}.between[1].component`],
  [
    `${pair0}.between[1]`,
    { component: 'firewall', category: 'firewall' },
    'must name one component, group or category',
  ],
  [`${pair0}.between[1]`, {}, 'must name one component, group or category'],
  [`${pair0}.between[1]`, 'firewall', 'must name one component, group or category'],
  [`${pair0}.between[1]`, { component: 'A B' }, 'must be 1 to 64 of a-z, 0-9 and -', `${pair0}.between[1].component`],
  [`${pair0}.between`, [{ component: 'firewall' }], 'must have at least 2 entries'],

  // reach
  ['components[0].pose', { at: [0, 0, 100_001] }, 'must be at most 100000', 'components[0].pose.at[2]'],
  ['components[0].pose', { at: [0, 0, -100_001] }, 'must be at least -100000', 'components[0].pose.at[2]'],
  ['components[0].pose', { at: [80_000, 80_000, 0] }, 'must lie within 100 m of the origin', 'components[0].pose.at'],
  ['lasers[0].point', [0, 100_001, 0], 'must be at most 100000', 'lasers[0].point[1]'],
  [
    'components[2].solids[0].shape.size',
    [200_001, 1, 1],
    'a corner lies more than 100 m from the origin of its own frame',
    'components[2].solids[0].shape',
  ],
  [
    'components[2].solids[0].shape.size',
    [1e308, 1e308, 1e308],
    'a corner lies more than 100 m from the origin of its own frame',
    'components[2].solids[0].shape',
  ],
  [
    'components[1].solids[0].shape.length',
    250_000,
    'a corner lies more than 100 m from the origin of its own frame',
    'components[1].solids[0].shape',
  ],
  [
    'components[2].pose',
    { at: [0, 99_800, 0] },
    'a corner lies more than 100 m from the origin of the car',
    'components[2].solids[0].shape',
  ],
  [
    'groups[0].pose.at',
    [0, 0, 99_990],
    'a corner lies more than 100 m from the origin of the car',
    'components[1].solids[0].shape',
  ],

  // meshes
  ...(
    [
      ['', 'must not be empty'],
      ['/pad.stl', 'must not be an absolute path'],
      ['\\\\host\\pad.stl', 'must not be an absolute path'],
      ['C:\\pad.stl', 'must not be an absolute path'],
      ['c:pad.stl', 'must not be an absolute path'],
      ['../pad.stl', "must not leave the document's folder"],
      ['meshes/../../pad.stl', "must not leave the document's folder"],
      ['meshes\\..\\..\\pad.stl', "must not leave the document's folder"],
      ['..', "must not leave the document's folder"],
      ['meshes\\pad.stl', 'must be written with / between folders'],
      ['http://host/pad.stl', 'must be a path, not an address'],
      ['file:pad.stl', 'must be a path, not an address'],
      ['pad\0.stl', 'must not hold control characters'],
      ['pad\n.stl', 'must not hold control characters'],
      ['meshes/', 'must name a file'],
      ['.', 'must name a file'],
      ['a'.repeat(1025), 'must have at most 1024 characters'],
      [5, 'must be text'],
    ] as const
  ).map(([mesh, reason]) => ['components[0].solids[1].shape.mesh', mesh, reason] as const),
];

describe('documents that are refused', () => {
  it.each(CASES.map((c, i) => [i + 1, ...c] as const))('%i: %s', (_n, path, value, reason, at = path) => {
    const result = loadScene(spoiled(sampleDocument(), path, value));
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.refusals[0]).toEqual({ path: at, reason });
  });

  it('is refused by text as by value', () => {
    for (const [path, value, reason, at] of CASES) {
      const document = spoiled(sampleDocument(), path, value);
      // what JSON cannot say comes out as null, which is another fault
      if (typeof value === 'number' && !Number.isFinite(value)) continue;
      const result = loadSceneText(JSON.stringify(document));
      expect(!result.ok && result.refusals[0]).toEqual({ path: at ?? path, reason });
    }
  });

  it.each([
    [null, 'the document must be an object'],
    [[], 'the document must be an object'],
    ['{}', 'the document must be an object'],
    [undefined, 'the document must be an object'],
    [7, 'the document must be an object'],
  ])('refuses %j', (input, reason) => {
    expect(loadScene(input)).toEqual({ ok: false, refusals: [{ path: '', reason }] });
  });

  it('names every fault, in the same order each time', () => {
    let document = spoiled(sampleDocument(), 'colour', 1);
    document = spoiled(document, 'components[0].id', 'A');
    document = spoiled(document, 'components[2].solids[0].shape.size[0]', -1);
    document = spoiled(document, 'name', '');
    const expected = ['name', 'components[0].id', 'components[2].solids[0].shape.size[0]', 'colour'];
    for (let i = 0; i < 3; i += 1) {
      const result = loadScene(document);
      expect(!result.ok && result.refusals.map((r) => r.path)).toEqual(expected);
    }
  });
});
