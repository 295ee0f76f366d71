// What the stage is to show, read from the stores. Parts that have not changed stay the same object, so that the stage can
// tell by looking.
import { findingKey } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { shownScene, type Bench } from '../bench-model';
import { selectionOf } from '../use-selection';
import { cutOf } from '../cutaway/cut-of';
import type { Cut } from './light';
import type { StageState } from './stage';

export function createStageReader(bench: Pick<Bench, 'open' | 'live' | 'session' | 'meshes'>) {
  let selectedFrom: readonly unknown[] = [];
  let selected: ReadonlySet<string> = new Set();
  let focusFrom: readonly unknown[] = [];
  let focus: ReadonlySet<string> | null = null;
  let cutFrom: readonly unknown[] = [];
  let cut: Cut | null = null;
  const isSame = (a: readonly unknown[], b: readonly unknown[]): boolean =>
    a.length === b.length && a.every((x, i) => x === b[i]);
  return (display: LengthDisplay): StageState => {
    const open = bench.open.getState();
    const session = bench.session.getState();
    const { findings } = bench.live.getState();
    const nextSelected = [open.scene, session.selected, session.reach];
    if (!isSame(nextSelected, selectedFrom)) {
      selectedFrom = nextSelected;
      selected = selectionOf(open.scene, session.selected, session.reach).moving;
    }
    const pair = session.finding === null ? null : session.finding.split('|').slice(0, 2);
    const isThere = pair !== null && findings.some((f) => findingKey(f) === session.finding);
    const nextFocus = isThere ? pair : [];
    if (!isSame(nextFocus, focusFrom)) {
      focusFrom = nextFocus;
      focus = isThere ? new Set(pair) : null;
    }
    const nextCut = [open.scene, session.cutOn];
    if (!isSame(nextCut, cutFrom)) {
      cutFrom = nextCut;
      cut = cutOf(open.scene, session.cutOn);
    }
    return {
      kept: open.scene,
      shown: shownScene(open),
      positions: session.positions,
      selected,
      hovered: session.hovered,
      presence: session.presence,
      focus,
      showsLasers: session.showsLasers,
      cut,
      arc: session.arc,
      findings,
      display,
      meshVersion: bench.meshes.version(),
    };
  };
}
