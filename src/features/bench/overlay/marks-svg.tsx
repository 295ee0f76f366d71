import { FONT, type Mark } from './mark';

const colour = (ink: string): string => `var(--${ink})`;

function MarkShape({ mark }: { readonly mark: Mark }) {
  switch (mark.kind) {
    case 'line':
      return (
        <polyline
          points={mark.points.map((p) => `${p[0].toFixed(1)},${p[1].toFixed(1)}`).join(' ')}
          fill="none"
          stroke={colour(mark.ink)}
          strokeWidth={mark.width}
          strokeDasharray={mark.dash?.join(' ')}
          opacity={mark.opacity}
        />
      );
    case 'path':
      return (
        <path
          d={mark.d}
          transform={`translate(${mark.x.toFixed(1)} ${mark.y.toFixed(1)}) scale(${mark.scale ?? 1})`}
          fill={mark.filled === true ? colour(mark.ink) : 'none'}
          stroke={mark.filled === true ? 'none' : colour(mark.ink)}
          strokeWidth={mark.width}
          strokeLinecap={mark.round === true ? 'round' : 'butt'}
          opacity={mark.opacity}
        />
      );
    case 'plate':
      return (
        <rect
          x={mark.x}
          y={mark.y}
          width={mark.width}
          height={mark.height}
          fill="var(--dye-deep)"
          fillOpacity={0.92}
          stroke={colour(mark.ink)}
          strokeWidth={1.2}
          opacity={mark.opacity}
        />
      );
    case 'text':
      return (
        <text
          x={mark.x}
          y={mark.y}
          fill={colour(mark.ink)}
          fontFamily={FONT}
          fontSize={mark.size}
          fontWeight={mark.weight}
          className="figures"
        >
          {mark.runs.map((run, i) => {
            const before = mark.runs[i - 1]?.raise ?? 0;
            return (
              <tspan key={i} fontSize={mark.size * run.size} dy={(before - run.raise) * mark.size}>
                {run.text}
              </tspan>
            );
          })}
        </text>
      );
  }
}

/** Marks in the order in which they lie over one another. */
export const MarksSvg = ({ marks }: { readonly marks: readonly Mark[] }) => (
  <>
    {marks.map((mark, i) => (
      <MarkShape key={i} mark={mark} />
    ))}
  </>
);
