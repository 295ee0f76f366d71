// One way to select, for tags and for the scene: a click selects a part; a second one the group it is clamped in; with Shift
// it is added or taken away.
import type { Bench } from './bench-model';

export function clickPart({ open, session }: Pick<Bench, 'open' | 'session'>, id: string | null, adds: boolean): void {
  const { selected, reach, select, set } = session.getState();
  if (id === null) {
    if (!adds) select([]);
    return;
  }
  const isAlone = selected.length === 1 && selected[0] === id;
  const isGrouped = open.getState().scene.components.find((c) => c.id === id)?.group !== undefined;
  if (isAlone && isGrouped && !adds) set({ reach: reach === 'part' ? 'group' : 'part' });
  else select([id], adds);
}
