// Empty hooks at the end of the rail: what the roll-call misses.
import { missingFrom, type RollCallEntry } from '#shared/review';
import { Menu, MenuItem, MenuLabel } from '../../../components/menu';
import { inWords } from '../../../lib/part-words';
import { useBench, useFacts, useOpen } from '../bench-model';
import { useRollCall } from './use-roll-call';

const saidOf = (entry: RollCallEntry): string =>
  entry.lacks === null ? entry.label : `${entry.label}: its ${entry.lacks}`;

export function MissingTags() {
  const { session } = useBench();
  const { words } = useFacts();
  const { entries, answer } = useRollCall();
  const canEdit = useOpen((o) => o.canEdit);
  const missing = missingFrom(entries);
  if (missing.length === 0) return null;
  return (
    <div className="cluster">
      <p className="cluster-label">Missing</p>
      <ul className="cluster-tags">
        {missing.map((entry) => (
          <li key={entry.key}>
            {canEdit ? (
              <Menu
                align="start"
                trigger={
                  <button type="button" className="tag-missing">
                    {inWords(saidOf(entry), words)}?
                  </button>
                }
              >
                <MenuLabel>{inWords(saidOf(entry), words)} is missing</MenuLabel>
                <MenuItem onSelect={() => session.getState().set({ sheet: 'shelf', shelfFor: entry.key })}>
                  Place one
                </MenuItem>
                {entry.lacks === null && answer !== null && (
                  <MenuItem onSelect={() => answer(entry.key, true)}>Not on this car</MenuItem>
                )}
              </Menu>
            ) : (
              <span className="tag-missing">{inWords(saidOf(entry), words)}?</span>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
