// The live findings, looked at from several sides.
import { useMemo } from 'react';
import { VERDICTS, type Finding, type Verdict } from '#shared/check';
import { useLive, useSession } from './bench-model';
import { findingKey } from '../../lib/finding-words';

export function useOpenFinding(): Finding | null {
  const findings = useLive((live) => live.findings);
  const key = useSession((s) => s.finding);
  return useMemo(() => findings.find((f) => findingKey(f) === key) ?? null, [findings, key]);
}

/** The worst verdict of each part. */
export function useWorstOf(): ReadonlyMap<string, Verdict> {
  const findings = useLive((live) => live.findings);
  return useMemo(() => {
    const worst = new Map<string, Verdict>();
    for (const { between, verdict } of findings) {
      for (const id of between) {
        const known = worst.get(id);
        if (known === undefined || VERDICTS.indexOf(verdict) < VERDICTS.indexOf(known)) worst.set(id, verdict);
      }
    }
    return worst;
  }, [findings]);
}
