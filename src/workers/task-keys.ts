// Names the inputs of a comparison: two tasks with one key have one finding, whatever document they come from.
import type { Prepared, Task } from '#shared/check';

type PreparedComponent = Prepared['components'][number];

/** More than any scene has parts; the rest is what the same parts were before. */
const MOST_NUMBERS = 6000;

/** All that a part brings into a finding, as text. */
function inputsOf(prepared: Prepared, { component: c }: PreparedComponent): string {
  const group = prepared.scene.groups.find((g) => g.id === c.group)?.pose ?? null;
  const solids = c.solids.map((s) => [s.id, s.shape, s.pose]);
  const motions = c.motions.map((m) => [m.id, m.use, m.solids, m.steps]);
  return JSON.stringify([c.id, c.tolerance, group, c.pose, solids, motions]);
}

/** Gives each state of a part a short number, the same one when that state comes back. */
export class TaskKeys {
  private numbers = new Map<string, number>();
  private next = 0;
  private current = new Map<string, number>();
  private changed: ReadonlySet<string> = new Set();
  private frame = '';

  /** Numbers the parts of a scene. */
  take(prepared: Prepared): void {
    const before = this.current;
    const texts = new Map<string, number>();
    this.current = new Map();
    for (const c of prepared.components) {
      const text = inputsOf(prepared, c);
      let number = this.numbers.get(text);
      if (number === undefined) {
        number = this.next;
        this.next += 1;
        this.numbers.set(text, number);
      }
      texts.set(text, number);
      this.current.set(c.component.id, number);
    }
    this.changed = new Set([...this.current].flatMap(([id, number]) => (before.get(id) === number ? [] : [id])));
    // forgetting a state costs a check at worst
    if (this.numbers.size > MOST_NUMBERS) this.numbers = texts;
    const { accuracy, rules } = prepared.scene;
    this.frame = `${accuracy} ${rules.touch} ${prepared.largest}`;
  }

  keyOf({ a, b, decision: { kind, required, allow } }: Task): string {
    return `${this.sideKey(a)}|${this.sideKey(b)}|${kind} ${required} ${allow ?? ''}|${this.frame}`;
  }

  /** Whether one of the two parts is another than in the scene before. */
  isTouched({ a, b }: Task): boolean {
    return this.changed.has(a.component.component.id) || this.changed.has(b.component.component.id);
  }

  private sideKey({ component, motion }: Task['a']): string {
    return `${this.current.get(component.component.id) ?? ''} ${motion?.motion.id ?? ''}`;
  }
}
