import { VerdictMark, VerdictTotals } from '../../components/verdict-mark';
import { When } from '../../components/when';

export interface LatestCheckProps {
  readonly latest: {
    readonly hits: number;
    readonly tight: number;
    readonly loose: number;
    readonly at: string;
  } | null;
  /** Whether what was checked still stands; left out where it is not known. */
  readonly current?: boolean;
}

/** What the latest dry fit found, in the order of harm. */
export function LatestCheck({ latest, current }: LatestCheckProps) {
  if (latest === null) return <span className="text-soft">no dry fit yet</span>;
  const { hits, tight, loose, at } = latest;
  return (
    <>
      {hits + tight + loose === 0 ? (
        <VerdictMark verdict="clears" />
      ) : (
        <VerdictTotals totals={{ hits, tight, loose }} className="!grid" />
      )}
      <span className="text-soft">
        dry fit, <When iso={at} />
      </span>
      {current === false && <span className="font-semibold text-accent">changed since</span>}
    </>
  );
}
