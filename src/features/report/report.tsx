// The interference report of one revision, as paper.
import { useEffect, type ReactNode } from 'react';
import type { LengthDisplay } from '#shared/units';
import { Button, ButtonLink } from '../../components/button';
import { Cautions } from '../../components/cautions';
import { Breadcrumbs, type Crumb } from '../../components/page-head';
import { When } from '../../components/when';
import { formatWhenFully } from '../../lib/format';
import type { WordChoice } from '../../lib/part-words';
import { inWords } from '../../lib/part-words';
import { ChangedNotice } from './changed-notice';
import { FindingsPart } from './findings-part';
import { GapChartPart } from './gap-chart-part';
import { LimitsPart } from './limits-part';
import { Opening } from './opening';
import type { ReportModel } from './report-model';
import { RollCallPart } from './roll-call-part';
import type { FindingPictures } from './use-finding-pictures';
import './report.css';

export interface ReportProps {
  readonly model: ReportModel;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  readonly crumbs: readonly Crumb[];
  readonly pictures: FindingPictures;
  /** What else the page puts on it: share links. */
  readonly children?: ReactNode;
}

export function Report({ model, display, words, crumbs, pictures, children }: ReportProps) {
  const { revision, scene, report } = model;
  const { dryFit } = revision;
  const at = dryFit?.endedAt ?? revision.createdAt;
  usePrintedWhole();
  return (
    <article className="report">
      <header className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3 border-b-2 border-strong pb-3">
        <div className="min-w-0">
          <div className="no-print">
            <Breadcrumbs crumbs={crumbs} />
          </div>
          <h1 className="text-lg leading-snug font-extrabold">
            <span className="hidden print:inline">{revision.projectName}: </span>
            {scene.name}, revision {revision.number}
            <span className="ml-2 font-normal text-soft">interference report</span>
          </h1>
          <p className="text-sm text-soft">
            dry fit of{' '}
            <span className="print:hidden">
              <When iso={at} />
            </span>
            {/* on paper "today" is soon wrong */}
            <span className="hidden print:inline">{formatWhenFully(at)}</span> by {dryFit?.startedBy ?? revision.madeBy}
          </p>
        </div>
        <div className="no-print flex flex-wrap items-center gap-3">
          <ButtonLink size="small" to={`/scenes/${revision.sceneId}`}>
            To the bench
          </ButtonLink>
          <ButtonLink size="small" to={`/scenes/${revision.sceneId}/dry-fits`}>
            All dry fits
          </ButtonLink>
          <Button size="small" onClick={() => window.print()}>
            Print
          </Button>
        </div>
      </header>
      <ChangedNotice scene={scene} sceneId={revision.sceneId} />
      <Opening model={model} display={display} />
      <RollCallPart model={model} display={display} say={(text) => inWords(text, words)} />
      <LimitsPart model={model} />
      <GapChartPart model={model} display={display} />
      <PictureProgress pictures={pictures} />
      <FindingsPart model={model} display={display} words={words} pictureOf={pictures.of} />
      {children}
      <Cautions />
      <p className="figures mt-3 text-sm break-words text-soft">
        Proven to <span className="whitespace-nowrap">{report.accuracy} mm</span>; parts that touch count as hits.
        Engine {report.engine}; scene {revision.sha256.slice(0, 12)}; save {revision.saveNumber}.
      </p>
    </article>
  );
}

function PictureProgress({ pictures }: { readonly pictures: FindingPictures }) {
  const { awaited, wanted, hasFailed, retry } = pictures;
  if (hasFailed) {
    return (
      <p className="no-print -mb-4 flex flex-wrap items-center gap-x-4 text-sm text-soft">
        Some pictures of findings are missing.
        <Button kind="text" size="small" onClick={retry}>
          Draw them now
        </Button>
      </p>
    );
  }
  if (awaited === 0) return null;
  return (
    <p className="no-print -mb-4 text-sm text-soft" role="status">
      Drawing the findings:{' '}
      <span className="figures">
        {wanted - awaited} of {wanted}
      </span>
    </p>
  );
}

/** On paper nothing can be unfolded, so all of it is open while printing. */
function usePrintedWhole(): void {
  useEffect(() => {
    let opened: HTMLDetailsElement[] = [];
    const open = (): void => {
      opened = [...document.querySelectorAll<HTMLDetailsElement>('.report details:not([open])')];
      for (const lid of opened) lid.open = true;
    };
    const close = (): void => {
      for (const lid of opened) lid.open = false;
    };
    window.addEventListener('beforeprint', open);
    window.addEventListener('afterprint', close);
    return () => {
      window.removeEventListener('beforeprint', open);
      window.removeEventListener('afterprint', close);
    };
  }, []);
}
