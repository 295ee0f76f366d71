// What a finding says, never by colour alone: a mark, a word, a colour, on both grounds.
import { useId, type ReactNode, type SVGProps } from 'react';
import { classes } from './classes';

export const VERDICT_WORDS = ['hits', 'tight', 'loose', 'seated', 'clears'] as const;
export type VerdictWord = (typeof VERDICT_WORDS)[number];

type SignProps = SVGProps<SVGSVGElement>;

const Sign = ({ children, ...rest }: SignProps & { readonly children: ReactNode }) => (
  <svg
    viewBox="0 0 16 16"
    width="1em"
    height="1em"
    fill="none"
    stroke="currentColor"
    className="inline-block flex-none self-center"
    aria-hidden="true"
    {...rest}
  >
    {children}
  </svg>
);

/** A witness mark, struck through, on hatching. */
function HitsSign(props: SignProps) {
  const id = useId();
  return (
    <Sign {...props}>
      <pattern id={id} width="3" height="3" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path d="M0 0v3" strokeWidth="1.2" />
      </pattern>
      <path d="M1 1h14v14H1z" fill={`url(#${id})`} strokeWidth=".8" opacity=".75" />
      <path d="M3.2 3.2l9.6 9.6M12.8 3.2l-9.6 9.6" strokeWidth="2.8" />
    </Sign>
  );
}

/** A double tick of chalk. */
const TightSign = (props: SignProps) => (
  <Sign {...props}>
    <path d="M2.6 14 7 2M8.6 14 13 2" strokeWidth="2.4" strokeLinecap="round" />
  </Sign>
);

/** A fine tick. */
const ClearsSign = (props: SignProps) => (
  <Sign {...props}>
    <path d="m2 8.6 4 4.4L14 3" strokeWidth="1.5" />
  </Sign>
);

/** A bolt head, seen from above. */
const SeatedSign = (props: SignProps) => (
  <Sign {...props}>
    <path d="M8 1.2 13.9 4.6v6.8L8 14.8 2.1 11.4V4.6z" strokeWidth="1.4" />
    <circle cx="8" cy="8" r="3" strokeWidth="1.1" />
  </Sign>
);

/** A split ring: a spring washer whose ends stand apart. */
const LooseSign = (props: SignProps) => (
  <Sign {...props}>
    <path d="M9.4 2.2A6 6 0 1 1 6.2 2.3" strokeWidth="2" />
    <path d="m9 .6.5 3.2M6.7.9l-.6 3" strokeWidth="1.2" />
  </Sign>
);

const SIGNS: Readonly<Record<VerdictWord, (props: SignProps) => ReactNode>> = {
  hits: HitsSign,
  tight: TightSign,
  clears: ClearsSign,
  seated: SeatedSign,
  loose: LooseSign,
};

const COLOURS: Readonly<Record<VerdictWord, string>> = {
  hits: 'text-hits',
  tight: 'text-tight',
  clears: 'text-clears',
  seated: 'text-seated',
  loose: 'text-loose',
};

export interface VerdictMarkProps {
  readonly verdict: VerdictWord;
  /** A figure in front of the word: "3 hits". */
  readonly count?: number;
  /** In a narrow place the word is read out, not shown. */
  readonly wordHidden?: boolean;
  readonly className?: string;
}

export function VerdictMark({ verdict, count, wordHidden = false, className }: VerdictMarkProps) {
  const Drawn = SIGNS[verdict];
  return (
    <span className={classes('inline-flex items-baseline gap-1.5 whitespace-nowrap', COLOURS[verdict], className)}>
      <Drawn />
      {count !== undefined && <b className="figures">{count}</b>}
      <span className={wordHidden ? 'sr-only' : 'font-semibold'}>{verdict}</span>
    </span>
  );
}

export interface VerdictTotalsProps {
  readonly totals: Readonly<Partial<Record<VerdictWord, number>>>;
  /** Verdicts without a finding are left out, except that nothing at all says so. */
  readonly className?: string;
}

/** What a check found, in the order of harm. */
export function VerdictTotals({ totals, className }: VerdictTotalsProps) {
  const found = VERDICT_WORDS.filter((word) => (totals[word] ?? 0) > 0);
  return (
    <span className={classes('inline-flex flex-wrap items-baseline gap-x-4 gap-y-1', className)}>
      {found.map((word) => (
        <VerdictMark key={word} verdict={word} count={totals[word]} />
      ))}
    </span>
  );
}
