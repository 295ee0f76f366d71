// The contexts that the bench's pieces read, around a scene that is only looked at.
import { useMemo, type ReactNode } from 'react';
import type { LengthDisplay } from '#shared/units';
import type { WordChoice } from '../../../lib/part-words';
import { BenchContext, FactsContext, type Bench, type BenchFacts } from '../bench-model';
import { InsetsContext, type Insets } from '../viewport/insets';

export interface SceneFrameProps {
  readonly bench: Bench;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  readonly insets?: Insets;
  readonly children: ReactNode;
}

const NO_INSETS: Insets = { left: 0, right: 0, top: 0, bottom: 0 };
const nothing = (): void => undefined;

export function SceneFrame({ bench, display, words, insets = NO_INSETS, children }: SceneFrameProps) {
  const facts = useMemo<BenchFacts>(
    () => ({
      display,
      setDisplay: nothing,
      words,
      teamId: '',
      projectId: '',
      projectName: '',
      absent: [],
      setAbsent: null,
    }),
    [display, words],
  );
  return (
    <BenchContext value={bench}>
      <FactsContext value={facts}>
        <InsetsContext value={insets}>{children}</InsetsContext>
      </FactsContext>
    </BenchContext>
  );
}
