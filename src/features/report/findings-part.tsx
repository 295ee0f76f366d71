// The findings: a search, a choice of verdicts, the ones to deal with in full, the rest gathered.
import { findingKey } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { Section } from '../../components/page-head';
import { SearchField } from '../../components/search-field';
import { EmptyState } from '../../components/states';
import { VERDICT_WORDS, VerdictMark } from '../../components/verdict-mark';
import { countOf } from '../../lib/format';
import type { WordChoice } from '../../lib/part-words';
import { useListQuery } from '../../lib/use-list-query';
import { FindingEntry } from './finding-entry';
import type { PictureState } from './finding-picture';
import { groupFindings } from './finding-groups';
import { Gathered } from './gathered';
import type { ReportModel } from './report-model';

export interface FindingsPartProps {
  readonly model: ReportModel;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  readonly pictureOf: (key: string) => PictureState;
}

export function FindingsPart({ model, display, words, pictureOf }: FindingsPartProps) {
  const { scene, report, revision } = model;
  const list = useListQuery(['worst'], ['all', ...VERDICT_WORDS]);
  const { search, state } = list;
  const groups = groupFindings(scene, report.findings, search, state === 'all' ? null : state);
  const shown = groups.full.length + groups.clears.length + groups.seated.length;
  const isNarrowed = search !== '' || state !== 'all';
  return (
    <Section title="Findings" note="worst first; a gap in motion is the least over the whole stroke">
      <div className="no-print mb-4 flex flex-wrap items-center gap-x-3 gap-y-2">
        <SearchField
          key={search === '' ? 'fresh' : 'searched'}
          label="Search by part or motion"
          value={search}
          className="min-w-0 grow basis-56"
          onSearch={(text) => list.set({ search: text })}
        />
        <div role="group" aria-label="Which verdicts" className="flex flex-wrap gap-1.5">
          <button
            type="button"
            className="report-chip"
            aria-pressed={state === 'all'}
            onClick={() => list.set({ state: 'all' })}
          >
            all
          </button>
          {VERDICT_WORDS.filter((word) => report.totals[word] > 0).map((word) => (
            <button
              key={word}
              type="button"
              className="report-chip"
              aria-pressed={state === word}
              onClick={() => list.set({ state: state === word ? 'all' : word })}
            >
              <VerdictMark verdict={word} count={report.totals[word]} />
            </button>
          ))}
        </div>
      </div>
      <p role="status" className={isNarrowed ? 'mb-2 text-sm text-soft' : 'sr-only'}>
        {countOf(shown, 'finding')} of {report.findings.length}
        {isNarrowed && ': the list is narrowed by the search or the verdict'}
      </p>
      {shown === 0 && (
        <EmptyState
          small
          title={isNarrowed ? 'No finding fits' : 'There is no pair of parts to compare'}
          action={
            isNarrowed && (
              <Button size="small" onClick={() => list.set({ search: '', state: 'all' })}>
                Show all findings
              </Button>
            )
          }
        />
      )}
      {groups.full.length === 0 && shown > 0 && !isNarrowed && (
        <p className="mb-3 text-lg">Nothing hits, is tight or is loose.</p>
      )}
      <ol className="finding-list">
        {groups.full.map((finding) => (
          <FindingEntry
            key={findingKey(finding)}
            scene={scene}
            sceneId={revision.sceneId}
            finding={finding}
            display={display}
            words={words}
            picture={pictureOf(findingKey(finding))}
          />
        ))}
      </ol>
      <Gathered
        key={`clears-${state}`}
        verdict="clears"
        title="with more room than they need"
        findings={groups.clears}
        scene={scene}
        sceneId={revision.sceneId}
        display={display}
        open={state === 'clears' || search !== ''}
      />
      <Gathered
        key={`seated-${state}`}
        verdict="seated"
        title="joints that meet as they should"
        findings={groups.seated}
        scene={scene}
        sceneId={revision.sceneId}
        display={display}
        open={state === 'seated' || search !== ''}
      />
    </Section>
  );
}
