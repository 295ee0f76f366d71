// A bench with nothing on it yet: what to do first.
import { Button } from '../../components/button';
import { useBench, useOpen } from './bench-model';

export function EmptyBench() {
  const { session } = useBench();
  const canEdit = useOpen((o) => o.canEdit);
  return (
    <div className="empty-bench">
      <p className="text-lg font-bold">Nothing on the bench yet.</p>
      {canEdit ? (
        <>
          <p>
            Begin with what cannot move: firewall, cowl, steering column, wiper motor, fender liners. Then the pedal
            box.
          </p>
          <p className="mt-3">
            <Button kind="main" onClick={() => session.getState().set({ sheet: 'shelf' })}>
              Take a part from the shelf
            </Button>
          </p>
        </>
      ) : (
        <p>Whoever designs this scene has not put a part on it.</p>
      )}
    </div>
  );
}
