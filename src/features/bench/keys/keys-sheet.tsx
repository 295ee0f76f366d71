// The sheet of keys.
import { Dialog } from '../../../components/dialog';
import { useBench, useOpen, useSession } from '../bench-model';
import { KEYS } from './key-map';

const SECTIONS = ['Looking', 'Selecting', 'Moving', 'Findings', 'The rest'] as const;

/** What hands do rather than keys. */
const BY_HAND: readonly (readonly [string, string])[] = [
  ['Drag', 'walk around; in a square-on look: shift the sheet'],
  ['Right drag, or two fingers', 'shift the look'],
  ['Wheel, or pinch', 'nearer and farther'],
  ['Click, again on the same', 'select a part, then its group'],
  ['Shift + click', 'add to what is selected, or take away'],
  ['Alt + click', 'the part behind'],
  ['Alt while dragging a handle', 'quarter steps; Shift: free'],
  ['Alt + left or right on a tag', 'earlier or later in the fitting order'],
];

export function KeysSheet() {
  const { session } = useBench();
  const isOpen = useSession((s) => s.sheet === 'keys');
  const canEdit = useOpen((o) => o.canEdit);
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) session.getState().set({ sheet: null });
      }}
      title="Keys"
      lead="On a Mac, Command stands for Ctrl."
      wide
    >
      <div className="keys-sheet">
        {SECTIONS.map((section) => (
          <section key={section}>
            <h3>{section}</h3>
            <dl>
              {KEYS.filter((k) => k.section === section && (canEdit || k.edits !== true)).map((k) => (
                <div key={k.what}>
                  <dt>
                    <kbd>{k.shown}</kbd>
                  </dt>
                  <dd>{k.what}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
        <section>
          <h3>By hand</h3>
          <dl>
            {BY_HAND.map(([how, what]) => (
              <div key={how}>
                <dt>{how}</dt>
                <dd>{what}</dd>
              </div>
            ))}
          </dl>
        </section>
      </div>
    </Dialog>
  );
}
