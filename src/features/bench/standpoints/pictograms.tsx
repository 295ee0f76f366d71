// Where a person stands, drawn: a few scribed strokes each. The three square-on looks stand between the corner marks of a
// drawing.
import type { ReactNode } from 'react';
import type { StandpointId } from './standpoints';

const Corners = () => <path d="M2 7V3h5M35 3h5v4M40 23v4h-5M7 27H2v-4" strokeWidth="1" opacity=".75" />;

/** A person seen from the side, seated behind a wheel. */
const Driver = () => (
  <>
    <circle cx="24" cy="6" r="3.4" />
    <path d="M24 10c3 2 4 6 3.5 12H16l-6 5M27.5 22h4l1.5-9" />
    <path d="M24 13l-9 3" />
    <path d="M14.6 11.5l1 9" strokeWidth="2.2" />
  </>
);

/** Two pedals and a shoe under them. */
const Footwell = () => (
  <>
    <path d="M10 3v11l-3 6h7M20 3v11l-3 6h7" />
    <path d="M27 25h12c0-3-3-4-6-4l-3-6h-4z" />
    <path d="M3 27h36" strokeWidth="1" opacity=".7" />
  </>
);

/** The bay from the front, its hood up. */
const EngineBay = () => (
  <>
    <path d="M8 14 11 3h20l3 11" />
    <path d="M4 27V16h34v11M4 21h6m22 0h6" />
    <path d="M15 27v-6h12v6M21 21v-3" />
  </>
);

/** The nose of the car from above, an eye over it. */
const Overhead = () => (
  <>
    <path d="M12 29V12c0-5 18-5 18 0v17M12 21h18" />
    <path d="M9 14v6M33 14v6" strokeWidth="2.6" />
    <path d="M15 5c4-4 8-4 12 0-4 4-8 4-12 0z" strokeWidth="1.3" />
    <circle cx="21" cy="5" r="1.2" fill="currentColor" stroke="none" />
  </>
);

/** A wheel arch with somebody leaning over it. */
const Fender = () => (
  <>
    <path d="M14 18h26M18 27a8.5 8.5 0 0 1 17 0M40 18v9h-5M14 18v9h4" />
    <circle cx="6" cy="6.4" r="3.2" />
    <path d="M6 10c1 3 1 6 0 17M6 12l10 4 5-2" />
  </>
);

const SideOn = () => (
  <>
    <Corners />
    <path d="M6 20c0-4 2-5 14-6l5-6h11v12" />
    <path d="M6 20h4m8 0h18" />
    <circle cx="14" cy="20.5" r="3.6" />
  </>
);

const PlanView = () => (
  <>
    <Corners />
    <path d="M36 7v16H14C5 23 5 7 14 7zM25 7v16M31 10v10" />
  </>
);

const FrontOn = () => (
  <>
    <Corners />
    <path d="M9 22v-8l4-2 2-5h12l2 5 4 2v8zM9 16h24" />
    <path d="M12 22v3M30 22v3" strokeWidth="2.6" />
  </>
);

const DRAWN: Readonly<Record<StandpointId, () => ReactNode>> = {
  driver: Driver,
  footwell: Footwell,
  bay: EngineBay,
  overhead: Overhead,
  'left-fender': Fender,
  'right-fender': Fender,
  side: SideOn,
  plan: PlanView,
  front: FrontOn,
};

export function StandpointPictogram({ id }: { readonly id: StandpointId }) {
  const Drawn = DRAWN[id];
  return (
    <svg
      viewBox="0 0 42 30"
      className="standpoint-picture"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      strokeLinejoin="round"
      aria-hidden="true"
      // the right fender is the left one's other hand
      style={id === 'right-fender' ? { transform: 'scaleX(-1)' } : undefined}
    >
      <Drawn />
    </svg>
  );
}
