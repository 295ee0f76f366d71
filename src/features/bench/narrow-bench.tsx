// The bench on a phone: the scene is turned and read; tags, tape and gaps come up as sheets from below.
import { VerdictTotals } from '../../components/verdict-mark';
import { CautionLine } from '../../components/cautions';
import { IconButton } from '../../components/icon-button';
import { CrossMark } from '../../components/pictograms';
import { useBench, useLive, useSession } from './bench-model';
import { Ladder } from './ladder/ladder';
import { totalsOf } from './ladder/totals';
import { PartsRail } from './rail/parts-rail';
import { Tape } from './tape/tape';
import { useSelection } from './use-selection';

export function NarrowBench() {
  const { session } = useBench();
  const sheet = useSession((s) => s.sheet);
  const findings = useLive((live) => live.findings);
  const { main } = useSelection();
  const { set } = session.getState();
  const toggle = (kind: 'ladder' | 'tape'): void => set({ sheet: sheet === kind ? null : kind });
  return (
    <>
      <div className="narrow-foot">
        <div className="narrow-bar">
          <button
            type="button"
            className="narrow-gaps"
            aria-expanded={sheet === 'ladder'}
            onClick={() => toggle('ladder')}
          >
            <b>Gaps</b>
            <VerdictTotals
              totals={{ ...totalsOf(findings), seated: 0, clears: 0, ...(main === null ? {} : { loose: 0 }) }}
            />
          </button>
          {main !== null && (
            <button
              type="button"
              className="narrow-tape"
              aria-expanded={sheet === 'tape'}
              onClick={() => toggle('tape')}
            >
              <b>Tape</b> <span>{main.name}</span>
            </button>
          )}
        </div>
        <PartsRail />
        <div className="narrow-caution">
          <CautionLine />
        </div>
      </div>
      {sheet === 'ladder' && (
        <div className="narrow-sheet">
          <CloseSheet what="gaps" />
          <Ladder />
        </div>
      )}
      {sheet === 'tape' && main !== null && (
        <div className="narrow-sheet narrow-sheet-card">
          <CloseSheet what="tape" />
          <Tape />
        </div>
      )}
    </>
  );
}

function CloseSheet({ what }: { readonly what: string }) {
  const { session } = useBench();
  return (
    <IconButton
      label={`Close the ${what}`}
      hint={false}
      className="narrow-close"
      onClick={() => session.getState().set({ sheet: null })}
    >
      <CrossMark />
    </IconButton>
  );
}
