import type { Presence } from '../session';

/** An eye: open, half shut for a faded part, shut for one that is off the bench. */
export const EyeMark = ({ presence }: { readonly presence: Presence | undefined }) => (
  <svg
    viewBox="0 0 20 20"
    width="1.1em"
    height="1.1em"
    fill="none"
    stroke="currentColor"
    strokeWidth="1.6"
    aria-hidden="true"
  >
    {presence === 'off' ? (
      <path d="M2 8.5c4.5 5 11.5 5 16 0M5 11.2l-1.6 2.4M10 12.4v3M15 11.2l1.6 2.4" />
    ) : (
      <>
        <path
          d="M2 10c4.5-5.6 11.5-5.6 16 0-4.5 5.6-11.5 5.6-16 0z"
          strokeDasharray={presence === 'faded' ? '2.6 2' : undefined}
        />
        <circle cx="10" cy="10" r="2.4" fill={presence === undefined ? 'currentColor' : 'none'} />
      </>
    )}
  </svg>
);
