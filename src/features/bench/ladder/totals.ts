import type { Finding, Verdict } from '#shared/check';

export function totalsOf(findings: readonly Finding[]): Readonly<Record<Verdict, number>> {
  const totals: Record<Verdict, number> = { hits: 0, tight: 0, loose: 0, seated: 0, clears: 0 };
  for (const { verdict } of findings) totals[verdict] += 1;
  return totals;
}
