import { useState } from 'react';
import { Link } from 'react-router-dom';
import { findingKey, type Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { Fraction } from '../../components/fraction';
import { Section } from '../../components/page-head';
import { VerdictMark } from '../../components/verdict-mark';
import { readingOf, whereWords } from '../../lib/finding-words';
import { gapChart } from './gap-chart';
import type { ReportModel } from './report-model';
import './gap-chart.css';

/** So many parts fit beside one another on a page. */
const FIRST = 12;

const UNIT: Readonly<Record<LengthDisplay, string>> = { in: 'inches', 'in-decimal': 'inches', mm: 'millimetres' };

export interface GapChartPartProps {
  readonly model: ReportModel;
  readonly display: LengthDisplay;
}

export function GapChartPart({ model: { scene, report, revision }, display }: GapChartPartProps) {
  const [showsAll, setShowsAll] = useState(false);
  const { parts, left, worst } = gapChart(scene, report, showsAll ? Infinity : FIRST);
  if (parts.length < 2) return null;
  return (
    <Section
      title="Gap chart"
      note={`${UNIT[display]}, the worst of each pair over every motion; where it hits, how deep`}
      actions={
        (left > 0 || showsAll) && (
          <Button kind="text" size="small" className="no-print" onClick={() => setShowsAll(!showsAll)}>
            {showsAll ? 'Only the closest calls' : `All ${parts.length + left} parts`}
          </Button>
        )
      }
    >
      <div className="gap-chart-run" role="group" aria-label="Pairs of parts" tabIndex={0}>
        <table className="gap-chart">
          <thead className="sr-only">
            <tr>
              <th scope="col">Part</th>
              {parts.slice(0, -1).map((part) => (
                <th key={part.id} scope="col">
                  {part.name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {parts.map((row, i) => (
              <tr key={row.id}>
                <th scope="row">{row.name}</th>
                {parts.slice(0, i).map((column) => (
                  <ChartCell
                    key={column.id}
                    finding={worst(row.id, column.id)}
                    title={`${column.name}, ${row.name}`}
                    where={(finding) => whereWords(scene, finding)}
                    sceneId={revision.sceneId}
                    display={display}
                  />
                ))}
                {/* the diagonal names the column below it */}
                {i < parts.length - 1 && (
                  <td className="gap-chart-name" aria-hidden="true">
                    <span>{row.name}</span>
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Section>
  );
}

interface ChartCellProps {
  readonly finding: Finding | null;
  readonly title: string;
  readonly where: (finding: Finding) => string;
  readonly sceneId: string;
  readonly display: LengthDisplay;
}

function ChartCell({ finding, title, where, sceneId, display }: ChartCellProps) {
  if (finding === null) {
    return (
      <td>
        <span className="sr-only">not compared</span>
        <span aria-hidden="true">·</span>
      </td>
    );
  }
  const { word, parts } = readingOf(finding, display);
  return (
    <td data-verdict={finding.verdict}>
      <Link
        to={`/scenes/${sceneId}?finding=${encodeURIComponent(findingKey(finding))}`}
        title={`${title}: ${finding.verdict}, ${where(finding)}`}
      >
        <VerdictMark verdict={finding.verdict} wordHidden />
        {word !== '' && <span className="sr-only">{word}</span>}
        {parts !== null && finding.verdict !== 'seated' && <Fraction parts={parts} unit={false} />}
      </Link>
    </td>
  );
}
