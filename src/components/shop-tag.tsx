import type { CSSProperties, ReactNode } from 'react';
import { classes } from './classes';
import { Hole } from './hole';

export interface ShopTagProps {
  readonly children: ReactNode;
  /** A strip of the part's finish along the foot: the token's name. */
  readonly finish?: string;
  /** A laser line along the top: it is the chosen one. */
  readonly chosen?: boolean;
  /** What is seen through the hole. */
  readonly through?: string;
  readonly className?: string;
}

/** A tag as it hangs on a part. Always card stock, also on the bench. */
export function ShopTag({ children, finish, chosen = false, through = 'var(--ground)', className }: ShopTagProps) {
  const style = { '--tag-through': through } as CSSProperties;
  return (
    <span className={classes('inline-block', className)} style={style}>
      <span
        className={classes(
          'on-card cut-tag flex items-center gap-2.5 py-1.5 pr-3 pl-3 text-ink',
          chosen && 'tag-chosen',
        )}
        style={finish === undefined ? undefined : { borderBottom: `4px solid var(--${finish})` }}
      >
        <Hole through="var(--tag-through)" />
        <span className="min-w-0 leading-tight font-semibold">{children}</span>
      </span>
    </span>
  );
}
