import { classes } from './classes';

/** The product's name, with the laser between its halves. */
export const Wordmark = ({ className }: { readonly className?: string }) => (
  <span className={classes('inline-flex items-center leading-none tracking-tight', className)}>
    <span className="font-light">gap</span>
    <span aria-hidden="true" className="mx-[0.14em] inline-block h-[1.15em] w-[0.12em] bg-laser" />
    <span className="font-extrabold">wright</span>
  </span>
);
