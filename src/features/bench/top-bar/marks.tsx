// Marks of the top bar, scribed as the kit's are.
import type { ReactNode } from 'react';

const Mark = ({ children }: { readonly children: ReactNode }) => (
  <svg
    viewBox="0 0 20 20"
    width="1.25em"
    height="1.25em"
    fill="none"
    stroke="currentColor"
    strokeWidth="1.6"
    aria-hidden="true"
  >
    {children}
  </svg>
);

/** One stroke back along the scriber's line. */
export const UndoMark = () => (
  <Mark>
    <path d="M7.5 3 3 7.2l4.5 4.2M3.4 7.2H12a4.6 4.6 0 0 1 0 9.3H7" />
  </Mark>
);

export const RedoMark = () => (
  <Mark>
    <path d="M12.5 3 17 7.2l-4.5 4.2M16.6 7.2H8a4.6 4.6 0 0 0 0 9.3h5" />
  </Mark>
);

/** Three letter punches. */
export const KeysMark = () => (
  <Mark>
    <path d="M2.5 6.5h4.4v7H2.5zM7.8 6.5h4.4v7H7.8zM13.1 6.5h4.4v7h-4.4zM4.7 9v2M10 9v2M15.3 9v2" strokeWidth="1.3" />
  </Mark>
);
