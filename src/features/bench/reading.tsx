// A finding's reading, always with its mark and word.
import type { Finding } from '#shared/check';
import { classes } from '../../components/classes';
import { Fraction } from '../../components/fraction';
import { VerdictMark } from '../../components/verdict-mark';
import { useFacts } from './bench-model';
import { readingOf } from '../../lib/finding-words';

export interface ReadingProps {
  readonly finding: Finding;
  /** `stacked`: the word under the length; `short`: the word only read out, where room is scarce. */
  readonly form?: 'line' | 'stacked' | 'short';
}

export function Reading({ finding, form = 'line' }: ReadingProps) {
  const { display } = useFacts();
  const { word, parts } = readingOf(finding, display);
  const said = word === '' ? finding.verdict : word;
  return (
    <span className={classes('reading', `reading-${form}`, `text-${finding.verdict}`)}>
      <VerdictMark verdict={finding.verdict} wordHidden />
      {said !== finding.verdict && <span className="sr-only">: </span>}
      <span className={form === 'short' ? 'sr-only' : 'reading-word'} aria-hidden={said === finding.verdict}>
        {said}
      </span>
      {parts !== null && <Fraction parts={parts} className="reading-length" />}
    </span>
  );
}
