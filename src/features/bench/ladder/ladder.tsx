// The right-hand side of the bench: the gap ladder, the line for all that has room, and below it the open finding.
import { CautionLine } from '../../../components/cautions';
import { useBench, useFacts, useLive, useOpen } from '../bench-model';
import { useFonts } from '../overlay/use-fonts';
import { useOpenFinding } from '../use-findings';
import { CheckPhase } from './check-phase';
import { FindingPanel } from './finding-panel';
import { GapLadder } from './gap-ladder';

export function Ladder() {
  const { session } = useBench();
  const findings = useLive((live) => live.findings);
  const hasParts = useOpen((o) => o.scene.components.length > 0);
  const finding = useOpenFinding();
  const { display } = useFacts();
  // labels that were measured before their font was there are measured anew
  const fonts = useFonts();
  return (
    <section className="ladder" aria-labelledby="gaps-title">
      <header className="ladder-head">
        <h2 id="gaps-title">Gaps</h2>
        <CheckPhase />
        <span className="ladder-deeds">
          <button type="button" className="button-text" onClick={() => session.getState().set({ sheet: 'rules' })}>
            gap rules
          </button>
          <button type="button" className="button-text" onClick={() => session.getState().set({ sheet: 'gaps' })}>
            as a list
          </button>
        </span>
      </header>
      {findings.length === 0 ? (
        <p className="ladder-empty">
          {hasParts
            ? 'No two parts to compare yet. Gaps show here as soon as there are two.'
            : 'Gaps show here as soon as two parts stand on the bench.'}
        </p>
      ) : (
        <GapLadder key={`${display} ${fonts}`} />
      )}
      {finding !== null && <FindingPanel finding={finding} />}
      <div className="ladder-caution">
        <CautionLine />
      </div>
    </section>
  );
}
