// What the live check is doing just now.
import { useLive } from '../bench-model';

export function CheckPhase() {
  const phase = useLive((live) => live.phase);
  const done = useLive((live) => live.done);
  const total = useLive((live) => live.total);
  const problem = useLive((live) => live.problem);
  if (phase === 'failed') {
    return (
      <p className="check-phase text-hits" role="alert">
        {problem ?? 'The check stopped. Load the page again; what was saved is safe.'}
      </p>
    );
  }
  const text =
    phase === 'reading-meshes'
      ? 'reading meshes'
      : phase === 'checking' && total > 0
        ? `checking ${done} of ${total}`
        : phase === 'checking'
          ? 'checking'
          : 'live';
  return (
    <p className="check-phase" role="status">
      <span className="check-lamp" data-phase={phase} aria-hidden="true" />
      {text}
    </p>
  );
}
