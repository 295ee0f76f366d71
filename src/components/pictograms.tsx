// Small marks drawn for this product: scribed strokes with square ends, as a scriber and a centre punch leave them. They go
// with a word or a label; none stands alone without a name.
import type { ReactNode, SVGProps } from 'react';

type MarkProps = Omit<SVGProps<SVGSVGElement>, 'children'>;

function Mark({ children, ...rest }: MarkProps & { readonly children: ReactNode }) {
  return (
    <svg
      viewBox="0 0 20 20"
      width="1.15em"
      height="1.15em"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      aria-hidden="true"
      focusable="false"
      {...rest}
    >
      {children}
    </svg>
  );
}

/** Add: two scribe lines that cross over a punch mark. */
export const PlusMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M10 2.5v15M2.5 10h15" />
    <circle cx="10" cy="10" r="3.2" strokeWidth="1" />
  </Mark>
);

/** Close: struck out twice. */
export const CrossMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="m4 4 12 12M16 4 4 16" />
  </Mark>
);

/** More to do: three punched holes. */
export const HolesMark = (p: MarkProps) => (
  <Mark {...p}>
    <circle cx="10" cy="3.8" r="1.7" />
    <circle cx="10" cy="10" r="1.7" />
    <circle cx="10" cy="16.2" r="1.7" />
  </Mark>
);

/** Look for: a loupe on its foot. */
export const LoupeMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M4 3.5h12M5.2 3.5 7 13h6l1.8-9.5M5 17h10l-2-4H7z" />
  </Mark>
);

/** Sorted: a centre punch, its point where the order begins. */
export const PunchMark = ({ up, ...p }: MarkProps & { readonly up: boolean }) => (
  <Mark {...p} transform={up ? undefined : 'rotate(180)'}>
    <path d="M7.5 17.5v-9L10 3l2.5 5.5v9z" fill="currentColor" strokeWidth="1" />
  </Mark>
);

/** Not sorted by this. */
export const PunchRestMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M7.5 17.5v-9L10 3l2.5 5.5v9z" strokeWidth="1" />
  </Mark>
);

/** Open downwards: a bent edge. */
export const BendMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M3.5 6.5 10 13l6.5-6.5" />
  </Mark>
);

/** A mail: an envelope as it is folded. */
export const MailMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M2.5 4.5h15v11h-15zM2.5 4.5 10 11l7.5-6.5" />
  </Mark>
);

/** A person at the bench: head and apron. */
export const PersonMark = (p: MarkProps) => (
  <Mark {...p}>
    <circle cx="10" cy="5.4" r="2.9" />
    <path d="M4 17.5c0-4.6 2.2-7 6-7s6 2.4 6 7M7.5 11v6.5m5-6.5v6.5" />
  </Mark>
);

/** A mesh: a corner of a fender in triangles. */
export const MeshMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M1.5 17.5 4 9.5l5-5 9-2-3 7-2 8zM4 9.5l11 0M9 4.5l6 5M1.5 17.5 15 9.5M4 9.5l9 8" strokeLinejoin="round" />
  </Mark>
);

/** Something stands in the way: a warning plate. */
export const PlateMark = (p: MarkProps) => (
  <Mark {...p}>
    <path d="M10 2.2 18.3 17H1.7zM10 8v4.4" />
    <path d="M10 14v1.4" />
  </Mark>
);
