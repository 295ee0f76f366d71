// A finding's reading as it is set on the ladder, with its mark and word.
import type { Finding } from '#shared/check';
import { Fraction } from '../../components/fraction';
import { VerdictMark } from '../../components/verdict-mark';
import { useFacts } from './bench-model';
import { readingOf } from './finding-words';

export function Reading({ finding, withWord = false }: { readonly finding: Finding; readonly withWord?: boolean }) {
  const { display } = useFacts();
  const { word, parts } = readingOf(finding, display);
  return (
    <span className={`reading text-${finding.verdict}`}>
      <VerdictMark verdict={finding.verdict} wordHidden={!withWord} />
      {word !== '' && <span className="reading-word">{word}</span>}
      {parts !== null && <Fraction parts={parts} className="reading-length" />}
    </span>
  );
}
