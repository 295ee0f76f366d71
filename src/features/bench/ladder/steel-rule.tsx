// The rule itself: steel, etched, its zero where every margin is nought.
import { lengthParts, type LengthDisplay } from '#shared/units';
import { ticksOf, type Span } from './rungs';

export const RULE_WIDTH = 38;

const TICK_LENGTH = [7, 12, 18, 26] as const;

/** `+1 1/2`, `−20`, `0`. */
function figure(at: number, display: LengthDisplay): string {
  if (Math.abs(at) < 1e-6) return '0';
  const { text } = lengthParts(Math.abs(at), display === 'in-decimal' ? 'in-decimal' : display);
  return `${at > 0 ? '+' : '\u2212'}${text.replace(/(\d)\/(\d)/, '$1\u2044$2')}`;
}

interface SteelRuleProps {
  readonly span: Span;
  readonly height: number;
  readonly display: LengthDisplay;
}

export function SteelRule({ span, height, display }: SteelRuleProps) {
  const perMm = height / (span.top - span.bottom);
  const y = (at: number): number => (span.top - at) * perMm;
  const ticks = ticksOf(span, display, perMm);
  const labelled = ticks.filter((t) => t.rank === 3 || (t.rank === 2 && perMm * (display === 'mm' ? 5 : 6.35) > 34));
  return (
    <svg className="rule-steel" width={RULE_WIDTH} height={height} aria-hidden="true">
      <defs>
        <linearGradient id="rule-steel" x1="0" y1="0" x2="1" y2="0">
          <stop offset="0" stopColor="var(--steel-light)" />
          <stop offset="0.5" stopColor="#f4f6f9" />
          <stop offset="0.72" stopColor="var(--steel)" />
          <stop offset="1" stopColor="var(--steel-dark)" />
        </linearGradient>
        <pattern id="rule-brushed" width="3" height="3" patternUnits="userSpaceOnUse">
          <path d="M0 .5h3M0 2h2" stroke="rgb(59 64 84 / 7%)" strokeWidth="0.6" />
        </pattern>
        <pattern id="rule-short" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0v7" stroke="var(--hits-ink)" strokeWidth="1.6" opacity=".34" />
        </pattern>
      </defs>
      <rect width={RULE_WIDTH} height={height} fill="url(#rule-steel)" rx="1" />
      <rect width={RULE_WIDTH} height={height} fill="url(#rule-brushed)" rx="1" />
      <rect y={y(0)} width={RULE_WIDTH} height={height - y(0)} fill="url(#rule-short)" />
      {ticks.map(({ at, rank }) => (
        <path
          key={at}
          d={`M0 ${y(at).toFixed(2)}h${TICK_LENGTH[rank]}`}
          stroke="var(--steel-etch)"
          strokeWidth={rank === 3 ? 1.6 : 1}
        />
      ))}
      {labelled.map(({ at }) => (
        <text
          key={at}
          x={RULE_WIDTH - 3}
          y={Math.min(height - 3, Math.max(10, y(at) - 2.5))}
          textAnchor="end"
          className="rule-figure"
          fill="var(--steel-etch)"
        >
          {figure(at, display)}
        </text>
      ))}
    </svg>
  );
}
