// The waiting list of the search: entries of seven numbers, least bound first. Flat arrays, nothing allocated per entry.

const FIELDS = 6;

export class BoundQueue {
  private bounds = new Float64Array(256);
  private fields = new Int32Array(256 * FIELDS);
  size = 0;
  /** The entry that `pop` took out last. */
  bound = 0;
  readonly entry = new Int32Array(FIELDS);

  clear(): void {
    this.size = 0;
  }

  private grow(): void {
    const bounds = new Float64Array(this.bounds.length * 2);
    bounds.set(this.bounds);
    this.bounds = bounds;
    const fields = new Int32Array(this.fields.length * 2);
    fields.set(this.fields);
    this.fields = fields;
  }

  private copy(from: number, to: number): void {
    this.bounds[to] = this.bounds[from]!;
    this.fields.copyWithin(to * FIELDS, from * FIELDS, from * FIELDS + FIELDS);
  }

  push(bound: number, a: number, b: number, c: number, d: number, e: number, f: number): void {
    if (this.size === this.bounds.length) this.grow();
    let i = this.size;
    this.size += 1;
    const { bounds } = this;
    while (i > 0) {
      const parent = (i - 1) >> 1;
      if (bounds[parent]! <= bound) break;
      this.copy(parent, i);
      i = parent;
    }
    bounds[i] = bound;
    const o = i * FIELDS;
    const { fields } = this;
    fields[o] = a;
    fields[o + 1] = b;
    fields[o + 2] = c;
    fields[o + 3] = d;
    fields[o + 4] = e;
    fields[o + 5] = f;
  }

  /** The least bound waiting, Infinity if none. */
  get least(): number {
    return this.size === 0 ? Infinity : this.bounds[0]!;
  }

  /** Takes out the entry with the least bound, into `bound` and `entry`; false if there is none. */
  pop(): boolean {
    if (this.size === 0) return false;
    this.bound = this.bounds[0]!;
    for (let k = 0; k < FIELDS; k += 1) this.entry[k] = this.fields[k]!;
    this.size -= 1;
    const last = this.size;
    if (last === 0) return true;
    const moved = this.bounds[last]!;
    let i = 0;
    for (;;) {
      let child = 2 * i + 1;
      if (child >= last) break;
      if (child + 1 < last && this.bounds[child + 1]! < this.bounds[child]!) child += 1;
      if (this.bounds[child]! >= moved) break;
      this.copy(child, i);
      i = child;
    }
    this.copy(last, i);
    return true;
  }
}
