// Where everything of a caption stands on its strip, CSS px of a picture that is `width` wide. Knows no canvas: texts are
// measured by a function that is handed in.
import type { Verdict } from '#shared/check';
import { plain, type TextRun } from '../../lib/text-runs';
import type { Caption } from './caption';

export type CaptionInk = 'ink' | 'ink-soft' | Verdict;

export interface CaptionText {
  readonly kind: 'text';
  readonly x: number;
  /** Baseline, from the strip's top. */
  readonly y: number;
  readonly runs: readonly TextRun[];
  readonly size: number;
  readonly weight: 400 | 600 | 800;
  readonly ink: CaptionInk;
}
export interface CaptionGlyph {
  readonly kind: 'glyph';
  readonly x: number;
  readonly y: number;
  readonly size: number;
  readonly verdict: Verdict;
}
export interface CaptionRule {
  readonly kind: 'rule';
  readonly y: number;
}
export type CaptionItem = CaptionText | CaptionGlyph | CaptionRule;

export interface CaptionLayout {
  readonly height: number;
  readonly items: readonly CaptionItem[];
  /** Where the product's name begins, from the strip's left; its baseline. */
  readonly name: { readonly x: number; readonly y: number; readonly size: number };
}

export type Measure = (runs: readonly TextRun[], size: number, weight: number) => number;

/** Breaks at spaces; a word that is too long stands alone and is cut with an ellipsis. */
export function wrapped(text: string, most: number, size: number, weight: number, measure: Measure): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const next = line === '' ? word : `${line} ${word}`;
    if (measure(plain(next), size, weight) <= most) line = next;
    else {
      if (line !== '') lines.push(line);
      line = cut(word, most, size, weight, measure);
    }
  }
  return line === '' ? lines : [...lines, line];
}

/** Cut to one line. */
export function cut(text: string, most: number, size: number, weight: number, measure: Measure): string {
  if (measure(plain(text), size, weight) <= most) return text;
  const letters = [...text];
  while (letters.length > 1 && measure(plain(`${letters.join('').trimEnd()}\u2026`), size, weight) > most)
    letters.pop();
  return `${letters.join('').trimEnd()}\u2026`;
}

/** Sizes follow the picture, so that it can still be read when a thread shows it small. */
function sizesFor(width: number) {
  const unit = Math.max(11, Math.min(17, width / 84));
  return { pad: unit * 1.4, title: unit * 1.35, text: unit * 1.08, small: unit * 0.92 };
}

export function layoutCaption(caption: Caption, width: number, measure: Measure): CaptionLayout {
  const { pad, title, text, small } = sizesFor(width);
  const room = width - 2 * pad;
  const items: CaptionItem[] = [];
  const say = (
    runs: readonly TextRun[],
    x: number,
    y: number,
    look: Pick<CaptionText, 'size' | 'weight' | 'ink'>,
  ): number => {
    items.push({ kind: 'text', x, y, runs, ...look });
    return x + measure(runs, look.size, look.weight);
  };
  const nameWidth = measure(plain('gap wright'), title, 800);
  let y = pad + title;
  const heads = room - nameWidth - 2 * pad;
  const head = cut(caption.title, heads, title, 800, measure);
  const after = say(plain(head), pad, y, { size: title, weight: 800, ink: 'ink' });
  const seenWidth = measure(plain(caption.seen), text, 400);
  const fits = after + title + seenWidth <= pad + heads;
  if (!fits) y += text * 1.5;
  say(plain(cut(caption.seen, room, text, 400, measure)), fits ? after + title : pad, y, {
    size: text,
    weight: 400,
    ink: 'ink-soft',
  });
  const name = { x: width - pad - nameWidth, y: pad + title, size: title };
  y += title * 0.7;
  items.push({ kind: 'rule', y });
  y += text * 0.45;
  for (const finding of caption.findings) {
    y += text * 1.5;
    items.push({ kind: 'glyph', x: pad + text * 0.55, y: y - text * 0.36, size: text, verdict: finding.verdict });
    const start = say(finding.reading, pad + text * 1.5, y, { size: text, weight: 800, ink: finding.verdict });
    const pairAt = Math.max(start + text, pad + text * 12);
    const pair = cut(finding.pair, pad + room - pairAt, text, 600, measure);
    const end = say(plain(pair), pairAt, y, { size: text, weight: 600, ink: 'ink' });
    const where = `\u00a0\u00a0${finding.where}`;
    if (end + measure(plain(where), text, 400) <= pad + room)
      say(plain(where), end, y, { size: text, weight: 400, ink: 'ink-soft' });
  }
  if (caption.rest !== '') {
    for (const line of wrapped(caption.rest, room, text, 600, measure)) {
      y += text * 1.5;
      say(plain(line), pad, y, { size: text, weight: 600, ink: 'ink-soft' });
    }
  }
  y += small * 0.7;
  for (const line of wrapped(caption.caution, room, small, 400, measure)) {
    y += small * 1.4;
    say(plain(line), pad, y, { size: small, weight: 400, ink: 'ink-soft' });
  }
  return { height: Math.ceil(y + pad * 0.8), items, name };
}
