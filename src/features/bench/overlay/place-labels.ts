// Finds room for labels beside their anchors: none over another, none over an anchor, all inside.

export interface Room {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export interface Label {
  readonly anchor: readonly [number, number];
  readonly width: number;
  readonly height: number;
}

export interface Place {
  readonly x: number;
  readonly y: number;
}

export interface Rect extends Place {
  readonly width: number;
  readonly height: number;
}

const MARGIN = 4;
/** How near an anchor a label of another may come. */
const CLEAR = 10;

const overlaps = (a: Rect, b: Rect, margin: number): boolean =>
  a.x < b.x + b.width + margin &&
  b.x < a.x + a.width + margin &&
  a.y < b.y + b.height + margin &&
  b.y < a.y + a.height + margin;

/** Ways from an anchor to its label: near first, up and to the right first. */
function* offers({ anchor, width, height }: Label): Generator<Place> {
  const [x, y] = anchor;
  for (const far of [18, 34, 54, 78, 106, 140, 180, 230]) {
    yield { x: x + far * 0.8, y: y - far * 0.7 - height };
    yield { x: x - far * 0.8 - width, y: y - far * 0.7 - height };
    yield { x: x + far * 0.8, y: y + far * 0.7 };
    yield { x: x - far * 0.8 - width, y: y + far * 0.7 };
    yield { x: x + far, y: y - height / 2 };
    yield { x: x - far - width, y: y - height / 2 };
    yield { x: x - width / 2, y: y - far - height };
    yield { x: x - width / 2, y: y + far };
  }
}

/** Places for labels, in their order; the first have the first choice. @param blocked where something else lies already */
export function placeLabels(labels: readonly Label[], room: Room, blocked: readonly Rect[] = []): Place[] {
  const taken: Rect[] = [...blocked];
  const anchors = labels.map(({ anchor }): Rect => ({
    x: anchor[0] - CLEAR,
    y: anchor[1] - CLEAR,
    width: 2 * CLEAR,
    height: 2 * CLEAR,
  }));
  return labels.map((label, own) => {
    const inside = (p: Place): Place => ({
      x: Math.max(room.left, Math.min(room.right - label.width, p.x)),
      y: Math.max(room.top, Math.min(room.bottom - label.height, p.y)),
    });
    let best: Rect | null = null;
    let least = Infinity;
    for (const offer of offers(label)) {
      const place = inside(offer);
      const rect = { ...place, width: label.width, height: label.height };
      const crossed = taken.filter((t) => overlaps(rect, t, MARGIN)).length;
      const covered = anchors.filter((a, i) => overlaps(rect, a, i === own ? -2 : 0)).length;
      const cost = crossed * 10 + covered;
      if (cost < least) {
        least = cost;
        best = rect;
      }
      if (cost === 0) break;
    }
    const rect = best ?? { ...inside({ x: label.anchor[0], y: label.anchor[1] }), ...label };
    taken.push({ x: rect.x, y: rect.y, width: label.width, height: label.height });
    return { x: Math.round(rect.x) + 0.5, y: Math.round(rect.y) + 0.5 };
  });
}
