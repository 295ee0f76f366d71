import type { ReactNode } from 'react';

/** A card in a steel holder, as on the front of a drawer. */
export const DrawerLabel = ({ children }: { readonly children: ReactNode }) => (
  <span className="label-holder max-w-full">
    <span className="on-card block bg-card-lift px-4 py-1 text-xl font-extrabold break-words shadow-[inset_0_2px_3px_rgb(30_33_54/35%)]">
      {children}
    </span>
  </span>
);
