// A link may lead to one finding: it is opened as soon as the check has it.
import { useEffect, useRef } from 'react';
import { notify } from '../../components/toast';
import { useBench, useLive } from './bench-model';
import { findingKey } from '../../lib/finding-words';
import { openFinding } from './open-finding';

export function useStartFinding(key: string | null): void {
  const bench = useBench();
  const findings = useLive((live) => live.findings);
  const phase = useLive((live) => live.phase);
  const answered = useRef<string | null>(null);
  useEffect(() => {
    if (key === null || answered.current === key) return undefined;
    const found = findings.find((f) => findingKey(f) === key);
    if (found === undefined) {
      if (phase === 'done') {
        answered.current = key;
        notify({ text: 'That finding is not there any more: the scene has changed since. These are the gaps of now.' });
      }
      return undefined;
    }
    // the viewport may still be on its way; without one the finding opens all the same
    const timer = setTimeout(() => {
      answered.current = key;
      openFinding(bench, found);
    }, 120);
    return () => clearTimeout(timer);
  }, [bench, findings, phase, key]);
}
