// Somebody else saved the same records: both, side by side, and the person chooses. Nothing is lost until then.
import type { Component, Scene } from '#shared/scene';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { useBench, useFacts, useOpen, useSession } from '../bench-model';
import { sayRecord } from './conflict-words';

export function ConflictDialog() {
  const { open, session } = useBench();
  const { display } = useFacts();
  const save = useOpen((o) => o.save);
  const isOpen = useSession((s) => s.sheet === 'conflict');
  const close = (): void => session.getState().set({ sheet: null });
  if (save.kind !== 'conflict') return null;
  const choose = (choice: 'mine' | 'theirs'): void => {
    open.getState().settle(choice);
    close();
  };
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(next) => {
        if (!next) close();
      }}
      title="Two people changed the same"
      lead="Somebody else saved while you worked. Whatever touched other things is in both already; only these are left to choose. Until you do, yours stays on this machine."
      wide
    >
      <table className="conflict">
        <thead>
          <tr>
            <th scope="col">what</th>
            <th scope="col">yours</th>
            <th scope="col">theirs</th>
          </tr>
        </thead>
        <tbody>
          {save.records.map((record) => (
            <tr key={record}>
              <th scope="row">{nameOf(record, save.mine, save.theirs)}</th>
              <td>{sayRecord(record, save.mine, save.theirs, display)}</td>
              <td>{sayRecord(record, save.theirs, save.mine, display)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="mt-5 flex flex-wrap gap-3 border-t border-dashed border-line pt-4">
        <Button kind="main" onClick={() => choose('mine')}>
          Keep yours
        </Button>
        <Button onClick={() => choose('theirs')}>Take theirs</Button>
        <Button kind="text" onClick={close}>
          Decide later
        </Button>
      </div>
    </Dialog>
  );
}

function nameOf(record: string, ...scenes: readonly Scene[]): string {
  const id = record.slice(record.indexOf(' ') + 1);
  for (const scene of scenes) {
    const found: Component | undefined = scene.components.find((c) => c.id === id);
    if (found !== undefined) return found.name;
    const other = [...scene.groups, ...scene.lasers].find((x) => x.id === id);
    if (other !== undefined) return other.name;
  }
  return record;
}
