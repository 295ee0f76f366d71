import { useId } from 'react';

/** Sixteenths of an inch at the screen's 96 px. */
const SIXTEENTH = 6;
const INCH = 16 * SIXTEENTH;
const INCHES = 40;

const tickHeight = (i: number): number => {
  if (i % 16 === 0) return 12;
  if (i % 8 === 0) return 9;
  if (i % 4 === 0) return 7;
  return i % 2 === 0 ? 5 : 3.5;
};

/** A steel scale across the page, etched in sixteenths. For the eye only. */
export function SteelScale({ className }: { readonly className?: string }) {
  const id = useId();
  return (
    <div aria-hidden="true" className={className}>
      <svg width="100%" height="20" className="block">
        <defs>
          <linearGradient id={`${id}-steel`} x1="0" y1="0" x2="0" y2="1">
            <stop offset="0" stopColor="var(--steel-light)" />
            <stop offset="0.55" stopColor="var(--steel)" />
            <stop offset="1" stopColor="var(--steel-dark)" />
          </linearGradient>
          <pattern id={`${id}-etch`} width={INCH} height="20" patternUnits="userSpaceOnUse">
            {Array.from({ length: 16 }, (_, i) => (
              <path
                key={i}
                d={`M${i * SIXTEENTH + 0.5} 20v-${tickHeight(i)}`}
                stroke="var(--steel-etch)"
                strokeWidth={i % 16 === 0 ? 1.4 : 0.9}
              />
            ))}
          </pattern>
        </defs>
        <rect width="100%" height="20" fill={`url(#${id}-steel)`} />
        <rect width="100%" height="20" fill={`url(#${id}-etch)`} />
        <g fill="var(--steel-etch)" fontSize="9" fontWeight="600" fontFamily="var(--font)">
          {Array.from({ length: INCHES }, (_, i) => (
            <text key={i} x={(i + 1) * INCH + 4} y="8.5">
              {i + 1}
            </text>
          ))}
        </g>
      </svg>
    </div>
  );
}
