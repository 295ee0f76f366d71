// Pairs that are in order: one line each, behind a lid that says how many.
import { Link } from 'react-router-dom';
import { findingKey, type Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Gap } from '../../components/fraction';
import { Need } from '../../components/sentence-line';
import { Cell, Head, Row, Table } from '../../components/table';
import { VerdictMark, type VerdictWord } from '../../components/verdict-mark';
import { VerdictReading } from '../../components/verdict-reading';
import { pairName, whereWords } from '../../lib/finding-words';

export interface GatheredProps {
  readonly verdict: VerdictWord;
  readonly title: string;
  readonly findings: readonly Finding[];
  readonly scene: Scene;
  readonly sceneId: string;
  readonly display: LengthDisplay;
  readonly open: boolean;
}

export function Gathered({ verdict, title, findings, scene, sceneId, display, open }: GatheredProps) {
  if (findings.length === 0) return null;
  const isJoint = verdict === 'seated';
  return (
    <details className="gathered" open={open}>
      <summary>
        <VerdictMark verdict={verdict} count={findings.length} />
        <span className="text-soft">{title}</span>
      </summary>
      <Table
        label={title}
        head={
          <>
            <Head>Pair</Head>
            <Head>Closest</Head>
            <Head figures>Gap</Head>
            {!isJoint && (
              <>
                <Head figures>Needs</Head>
                <Head figures>Margin</Head>
              </>
            )}
          </>
        }
      >
        {findings.map((finding) => (
          <Row key={findingKey(finding)}>
            <Cell className="font-semibold">
              <Link to={`/scenes/${sceneId}?finding=${encodeURIComponent(findingKey(finding))}`} className="link">
                {pairName(scene, finding)}
              </Link>
            </Cell>
            <Cell head="Closest" className="text-soft">
              {whereWords(scene, finding)}
            </Cell>
            <Cell head="Gap" figures>
              <VerdictReading finding={finding} display={display} />
            </Cell>
            {!isJoint && (
              <>
                <Cell head="Needs" figures>
                  <Need mm={finding.required} display={display} />
                </Cell>
                <Cell head="Margin" figures>
                  <Gap mm={finding.margin} display={display} />
                </Cell>
              </>
            )}
          </Row>
        ))}
      </Table>
    </details>
  );
}
