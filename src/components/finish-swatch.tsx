import { classes } from './classes';

export interface FinishSwatchProps {
  /** The token's name: "red-oxide". */
  readonly finish: string;
  /** The finish's name in words, shown beside it. */
  readonly label?: string;
  readonly className?: string;
}

/** A finish as on a paint maker's card: a strip of the colour. */
export const FinishSwatch = ({ finish, label, className }: FinishSwatchProps) => (
  <span className={classes('inline-flex items-center gap-2', className)}>
    <span
      aria-hidden="true"
      className="inline-block h-3.5 w-6 border border-ink/40"
      style={{ background: `var(--${finish})` }}
    />
    {label !== undefined && <span className="text-sm">{label}</span>}
  </span>
);
