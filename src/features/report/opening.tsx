// What a report says first: one sentence, then what was found in figures.
import { reportSentence } from '#shared/review';
import type { LengthDisplay } from '#shared/units';
import { SentenceLine } from '../../components/sentence-line';
import { Stamp } from '../../components/stamp';
import { VerdictMark, VerdictTotals } from '../../components/verdict-mark';
import type { ReportModel } from './report-model';

export interface OpeningProps {
  readonly model: ReportModel;
  readonly display: LengthDisplay;
}

export function Opening({ model: { scene, report, missing, boxes }, display }: OpeningProps) {
  const { verdict, parts } = reportSentence(scene, report);
  const inside = report.findings.filter((f) => f.insideSheet === true).length;
  return (
    <section aria-label="In one sentence" className="report-opening">
      {inside > 0 && (
        <p className="report-first">
          <b>{inside === 1 ? 'One pair' : `${inside} pairs`}</b> may lie one inside the other where a scan is broken: a
          gap to an open surface says nothing about that. Look at {inside === 1 ? 'it' : 'them'} before you trust the
          rest.
        </p>
      )}
      <p className="report-sentence">
        {verdict !== null && (
          <Stamp colour={verdict} className="mr-3 align-baseline">
            <VerdictMark verdict={verdict} />
          </Stamp>
        )}
        <SentenceLine parts={parts} display={display} />
      </p>
      <div className="mt-5 flex flex-wrap items-baseline gap-x-6 gap-y-2">
        <VerdictTotals totals={report.totals} className="!gap-x-6" />
        {missing.length > 0 && (
          <a href="#roll-call" className="report-flag">
            Roll-call: {missing.length === 1 ? `${missing[0]!.label} missing` : `${missing.length} missing`}
          </a>
        )}
        {boxes.length > 0 && (
          <a href="#roll-call" className="report-flag">
            {boxes.length === 1
              ? `${boxes[0]!.name} hangs on one wall`
              : `${boxes.length} pedal boxes hang on one wall`}
          </a>
        )}
      </div>
    </section>
  );
}
