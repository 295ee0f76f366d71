// Opening a finding: the motions go to where it is, the camera to its witness mark.
import type { Finding } from '#shared/check';
import type { Bench } from './bench-model';
import { findingKey } from '../../lib/finding-words';
import { motionKey } from './viewport/bodies';

export function openFinding({ session, view }: Pick<Bench, 'session' | 'view'>, finding: Finding): void {
  const positions = Object.fromEntries(
    finding.motions.map((m, i) => [motionKey(m.component, m.motion), finding.at.positions[i] ?? 0]),
  );
  const first = finding.motions[0];
  session.getState().set({
    finding: findingKey(finding),
    positions,
    arc: first === undefined ? null : motionKey(first.component, first.motion),
    hoveredFinding: null,
    sheet: null,
  });
  view.hand()?.lookAt(finding);
}

/** Everything goes back to rest. */
export function closeFinding({ session }: Pick<Bench, 'session'>): void {
  session.getState().set({ finding: null, positions: {}, arc: null });
}
