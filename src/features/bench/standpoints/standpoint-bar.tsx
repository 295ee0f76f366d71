// Where to stand: one press and the camera goes there; the numbers do it too.
import { inWords } from '../../../lib/part-words';
import { useBench, useFacts, useSession } from '../bench-model';
import { StandpointPictogram } from './pictograms';
import { isSquareOn, STANDPOINT_NAME, STANDPOINTS } from './standpoints';

export function StandpointBar() {
  const { view } = useBench();
  const { words } = useFacts();
  const current = useSession((s) => s.standpoint);
  return (
    <div className="standpoints" role="group" aria-label="Standpoints">
      {STANDPOINTS.map((id, i) => (
        <button
          key={id}
          type="button"
          className="standpoint"
          data-square={isSquareOn(id) || undefined}
          aria-pressed={current === id}
          aria-keyshortcuts={String(i + 1)}
          onClick={() => view.hand()?.standAt(id)}
        >
          <span className="standpoint-key" aria-hidden="true">
            {i + 1}
          </span>
          <StandpointPictogram id={id} />
          <span className="standpoint-name">{inWords(STANDPOINT_NAME[id], words)}</span>
        </button>
      ))}
    </div>
  );
}
