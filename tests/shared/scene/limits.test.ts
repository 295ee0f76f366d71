import { describe, expect, it } from 'vitest';
import { loadScene, loadSceneText, MAX_REFUSALS } from '#shared/scene';
import { sampleDocument, spoiled } from './sample';

const box = (id: string): unknown => ({ id, shape: { kind: 'box', size: [1, 1, 1] } });
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

describe('limits', () => {
  const many = (n: number): unknown[] =>
    Array.from({ length: n }, (_, i) => ({ id: `c${i}`, name: `C ${i}`, category: 'other', solids: [box('s')] }));
  const bare = (components: unknown[]): unknown => ({ format: 'gapwright-scene', version: 1, name: 'x', components });

  it('takes 500 components and not one more', () => {
    expect(loadScene(bare(many(500))).ok).toBe(true);
    expect(loadScene(bare(many(501)))).toEqual({
      ok: false,
      refusals: [{ path: 'components', reason: 'must have at most 500 entries' }],
    });
  });

  it('takes 2,000 solids in all and not one more', () => {
    const of = (counts: readonly number[]): unknown =>
      bare(
        counts.map((n, c) => ({
          id: `c${c}`,
          name: 'C',
          category: 'other',
          solids: Array.from({ length: n }, (_, i) => box(`s${i}`)),
        })),
      );
    expect(loadScene(of([2000])).ok).toBe(true);
    expect(loadScene(of([1000, 1000])).ok).toBe(true);
    expect(loadScene(of([1000, 1000, 1, 1]))).toEqual({
      ok: false,
      refusals: [{ path: 'components[2].solids', reason: 'the scene has more than 2000 solids' }],
    });
    expect(loadScene(of([2001]))).toMatchObject({ ok: false, refusals: [{ path: 'components[0].solids' }] });
  });

  it('takes 4 MB and not a byte more, of text and of bytes', () => {
    const text = JSON.stringify(sampleDocument());
    const limit = 4 * 1024 * 1024;
    const full = text + ' '.repeat(limit - text.length);
    expect(loadSceneText(full).ok).toBe(true);
    expect(loadSceneText(new TextEncoder().encode(full)).ok).toBe(true);
    const reason = `the document has ${limit + 1} bytes, more than the ${limit} allowed`;
    expect(loadSceneText(`${full} `)).toEqual({ ok: false, refusals: [{ path: '', reason }] });
    expect(loadSceneText(new TextEncoder().encode(`${full} `))).toEqual({
      ok: false,
      refusals: [{ path: '', reason }],
    });
  });

  it('counts bytes, not characters', () => {
    for (const [character, bytes] of [
      ['ä', 2],
      ['″', 3],
      ['😀', 4],
    ] as const) {
      const text = JSON.stringify({ ...sampleDocument(), name: character });
      expect(new TextEncoder().encode(text).length).toBe([...text].length - 1 + bytes);
      const full = text + ' '.repeat(4 * 1024 * 1024 - ([...text].length - 1 + bytes));
      expect(loadSceneText(full).ok).toBe(true);
      expect(loadSceneText(`${full} `).ok).toBe(false);
    }
  });

  it('takes what lies just within', () => {
    let document = sampleDocument();
    for (const [path, value] of [
      ['name', '😀'.repeat(120)],
      ['lasers[0].id', 'a'.repeat(64)],
      ['components[1].note', '″'.repeat(2000)],
      ['components[0].motions[0].steps[0]', swing(3600)],
      ['components[1].motions[0].steps', [slide(20_000), swing(1, 0)]],
      ['rules.touch', 0.0001],
      ['accuracy', 0.0001],
      ['lasers[0].point', [-100_000, 0, 0]],
      ['components[2].solids[0].shape.size', [199_998, 1, 1]],
    ] as const) {
      document = spoiled(document, path, value);
      expect(loadScene(document)).toMatchObject({ ok: true });
    }
  });
});

describe('hostile input', () => {
  const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
  const head = '"format":"gapwright-scene","version":1,"name":"x"';

  it.each([
    ['', 'the document is empty'],
    ['   ', /^the document is not JSON: /],
    ['{', /^the document is not JSON: /],
    ['{} {}', /^the document is not JSON: /],
    ["{'name': 1}", /^the document is not JSON: /],
    ['NaN', /^the document is not JSON: /],
    ['['.repeat(4_000_000), /^the document is not JSON: /],
    [`${'['.repeat(100_000)}${']'.repeat(100_000)}`, 'the document must be an object'],
    [`{"a":${'['.repeat(40)}${']'.repeat(40)}}`, 'the document is nested too deeply'],
    [`{${head},"components":${'['.repeat(100_000)}${']'.repeat(100_000)}}`, 'the document is nested too deeply'],
  ])('%.40s', (text, reason) => {
    const result = loadSceneText(text);
    expect(result.ok).toBe(false);
    if (result.ok) return;
    expect(result.refusals).toHaveLength(1);
    expect(result.refusals[0].reason).toMatch(typeof reason === 'string' ? new RegExp(`^${reason}$`) : reason);
    expect(result.refusals[0].reason.length).toBeLessThan(300);
  });

  it('refuses a number too large for a double', () => {
    const text = JSON.stringify(spoiled(sampleDocument(), 'accuracy', 5)).replace('"accuracy":5', '"accuracy":1e999');
    expect(loadSceneText(text)).toEqual({
      ok: false,
      refusals: [{ path: 'accuracy', reason: 'must be a finite number' }],
    });
  });

  it.each([
    ['a lone continuation byte', [0x7b, 0x80, 0x7d]],
    ['an overlong slash', [0x22, 0xc0, 0xaf, 0x22]],
    ['half a surrogate pair', [0x22, 0xed, 0xa0, 0x80, 0x22]],
    ['a cut character', [0x22, 0xe2, 0x82]],
    ['UTF-16', [0xff, 0xfe, 0x7b, 0x00]],
    ['beyond Unicode', [0x22, 0xf4, 0x90, 0x80, 0x80, 0x22]],
  ])('refuses bytes that are not UTF-8: %s', (_what, source) => {
    expect(loadSceneText(Uint8Array.from(source))).toEqual({
      ok: false,
      refusals: [{ path: '', reason: 'the document is not UTF-8 text' }],
    });
  });

  it('leaves the prototype of objects alone', () => {
    const result = loadSceneText(`{${head},"components":[],"__proto__":{"polluted":true}}`);
    expect(result).toEqual({ ok: false, refusals: [{ path: '__proto__', reason: 'is not known' }] });
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  it.each([
    ['lasers', `"components":[],"lasers":[${'0,'.repeat(2_000_000)}0]`],
    ['pair rules', `"components":[],"rules":{"pairs":[${'{},'.repeat(1_300_000)}{}]}`],
    ['components', `"components":[${'{},'.repeat(1_300_000)}{}]`],
    ['solids', `"components":[{"solids":[${'0,'.repeat(2_000_000)}0]}]`],
    ['parameters', `"components":[{"recipe":{"kind":"x","params":{${'"a":[],'.repeat(590_000)}"b":[]}}}]`],
    ['keys', `"components":[],${Array.from({ length: 300_000 }, (_, i) => `"k${i}":1`).join(',')}`],
  ])('does not drown in 4 MB of %s', (_what, inside) => {
    const source = bytes(`{${head},${inside}}`);
    expect(source.length).toBeLessThan(4 * 1024 * 1024 + 1);
    const result = loadSceneText(source);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.refusals.length).toBeLessThanOrEqual(MAX_REFUSALS);
  });

  it.each(['lasers', 'groups', 'rules.pairs', 'components[0].holes', 'components[0].recipe.params'])(
    'stops reading %s after the hundredth fault',
    (path) => {
      let reads = 0;
      const bad = Array.from({ length: 5000 }, () => ({
        get id() {
          reads += 1;
          return 'NOT AN ID';
        },
      }));
      const value = path.endsWith('params') ? { ...bad } : bad;
      const result = loadScene(spoiled(sampleDocument(), path, value));
      expect(!result.ok && result.refusals).toHaveLength(MAX_REFUSALS);
      // once each by the search for hostile keys, then by the schema as far as it goes
      expect(reads).toBeLessThan(5000 + 1000);
    },
  );

  it('does not drown in references either', () => {
    const ids = Array.from({ length: 2000 }, (_, i) => `s${i}`);
    const named = `[${ids.map((id) => `"${id}"`).join(',')}]`;
    const solids = ids.map((id) => `{"id":"${id}","shape":{"kind":"box","size":[1,1,1]}}`).join(',');
    const motions = Array.from(
      { length: 16 },
      (_, i) =>
        `{"id":"m${i}","name":"m","use":"service","solids":${named},"steps":[{"kind":"slide","along":[1,0,0],"to":1}]}`,
    ).join(',');
    const pairs = `{"between":[{"group":"x"},{"component":"y"}],"gap":1},`.repeat(50_000);
    const text = `{${head},"components":[{"id":"a","name":"A","category":"other","solids":[${solids}],"motions":[${motions}]}],"rules":{"pairs":[${pairs.slice(0, -1)}]}}`;
    const result = loadSceneText(text);
    expect(!result.ok && result.refusals).toHaveLength(MAX_REFUSALS);
  });
});
