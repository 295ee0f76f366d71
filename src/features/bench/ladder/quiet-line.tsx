// What does not stand on the rule: pairs with more room than it is high, and joints.
import { formatLength } from '#shared/units';
import { VerdictMark } from '../../../components/verdict-mark';
import { useBench, useFacts } from '../bench-model';
import type { Ladder, Span } from './rungs';

interface QuietLineProps {
  readonly ladder: Ladder;
  readonly span: Span;
  /** Rungs that stand on the rule without a label, for want of room. */
  readonly unlabelled: number;
}

export function QuietLine({ ladder, span, unlabelled }: QuietLineProps) {
  const { session } = useBench();
  const { display } = useFacts();
  const { above, seated, loose } = ladder;
  if (above.length + seated.length + loose.length + unlabelled === 0) return null;
  return (
    <button type="button" className="ladder-quiet" onClick={() => session.getState().set({ sheet: 'gaps' })}>
      {loose.length > 0 && <VerdictMark verdict="loose" count={loose.length} />}
      {seated.length > 0 && <VerdictMark verdict="seated" count={seated.length} />}
      {above.length + unlabelled > 0 && (
        <span>
          {[
            ...(above.length > 0 ? [`${above.length} more with over ${formatLength(span.top, display)} to spare`] : []),
            ...(unlabelled > 0 ? [`${unlabelled} unlabelled`] : []),
          ].join('; ')}
        </span>
      )}
    </button>
  );
}
