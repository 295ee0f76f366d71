// A pedal box hangs on two planes, the firewall and the underside of the cowl; one that is bolted to only one of them flexes
// and cracks the wall. A box without joints to both is reported.
import type { Category, Component, Scene } from '#shared/scene';

export interface LooseBox {
  /** The box's or its group's name. */
  readonly name: string;
  readonly components: readonly string[];
  readonly lacks: readonly ('firewall' | 'cowl')[];
}

/** The pedal boxes of a scene: components of that category, each with its group, and groups that hold pedals. */
function pedalBoxes(scene: Scene): { name: string; members: readonly Component[] }[] {
  const grouped = scene.groups.flatMap((group) => {
    const members = scene.components.filter((c) => c.group === group.id);
    const isBox = members.some((c) => c.category === 'pedal-box' || c.category === 'pedal');
    return isBox ? [{ name: group.name, members }] : [];
  });
  const single = scene.components
    .filter((c) => c.category === 'pedal-box' && c.group === undefined)
    .map((c) => ({ name: c.name, members: [c] }));
  return [...grouped, ...single];
}

/** Pedal boxes that are not jointed to both firewall and cowl. */
export function looseBoxes(scene: Scene): LooseBox[] {
  const categoryOf = new Map<string, Category>(scene.components.map((c) => [c.id, c.category]));
  return pedalBoxes(scene).flatMap(({ name, members }) => {
    const ids = new Set(members.map((c) => c.id));
    const held = new Set<Category | undefined>();
    for (const rule of scene.rules.pairs) {
      if (rule.joint === undefined) continue;
      const [a, b] = rule.between.map((side) => ('component' in side ? side.component : ''));
      if (ids.has(a!)) held.add(categoryOf.get(b!));
      if (ids.has(b!)) held.add(categoryOf.get(a!));
    }
    const lacks = (['firewall', 'cowl'] as const).filter((wall) => !held.has(wall));
    return lacks.length === 0 ? [] : [{ name, components: [...ids], lacks }];
  });
}
