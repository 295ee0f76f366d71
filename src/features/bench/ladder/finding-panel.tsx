// The open finding: the pair, the rule and where it comes from, what the margin is made of, where on the stroke, what would
// change it.
import type { ReactNode } from 'react';
import type { Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import { formatPercent } from '#shared/units';
import { Gap, Length } from '../../../components/fraction';
import { IconButton } from '../../../components/icon-button';
import { CrossMark } from '../../../components/pictograms';
import { useBench, useFacts, useLive, useOpen } from '../bench-model';
import { findingKey, motionName, pairName } from '../../../lib/finding-words';
import { closeFinding, openFinding } from '../open-finding';
import { Reading } from '../reading';
import { ruleWords } from '../../../lib/rule-words';
import { spansOf } from '../../../lib/spans';
import { StrokeStrip } from './stroke-strip';
import { WhatWouldChangeIt } from './what-would-change-it';

const Row = ({ name, children, note }: { name: string; children: ReactNode; note?: ReactNode }) => (
  <div className="finding-row">
    <dt>{name}</dt>
    <dd>
      {children}
      {note !== undefined && <span className="finding-note">{note}</span>}
    </dd>
  </div>
);

function where(scene: Scene, finding: Finding): string {
  if (finding.motions.length === 0) return 'at rest';
  return finding.motions
    .map((m, i) => `${formatPercent(finding.at.positions[i] ?? 0)} of ${motionName(scene, m.component, m.motion)}`)
    .join(', ');
}

export function FindingPanel({ finding }: { readonly finding: Finding }) {
  const bench = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.preview ?? o.scene);
  const findings = useLive((live) => live.findings);
  const others = findings.filter(
    (f) => f.between.join('|') === finding.between.join('|') && findingKey(f) !== findingKey(finding),
  );
  const shares = finding.between.map((id) => scene.components.find((c) => c.id === id)?.tolerance ?? 0);
  const origin = ruleWords(scene, finding);
  return (
    <section className="finding" aria-label={`Finding: ${pairName(scene, finding)}`}>
      <header className="finding-head">
        <div>
          <h3>{pairName(scene, finding)}</h3>
          <p className="finding-verdict">
            <Reading finding={finding} /> <span className="text-soft">{where(scene, finding)}</span>
          </p>
        </div>
        <IconButton label="Close the finding" onClick={() => closeFinding(bench)}>
          <CrossMark />
        </IconButton>
      </header>
      {finding.insideSheet === true && (
        <p className="finding-warning">
          One of the two seems to lie inside a broken scan. Look before you trust the gap.
        </p>
      )}
      {finding.motions.map((m, i) => {
        const component = scene.components.find((c) => c.id === m.component);
        const motion = component?.motions.find((x) => x.id === m.motion);
        if (component === undefined || motion === undefined) return null;
        const spans = spansOf([finding], m.component, m.motion);
        return (
          <StrokeStrip
            key={`${m.component}.${m.motion}`}
            component={component}
            motion={motion}
            hits={spans.hits}
            tight={spans.tight}
            witness={finding.at.positions[i] ?? 0}
          />
        );
      })}
      <WhatWouldChangeIt key={findingKey(finding)} finding={finding} />
      <dl className="finding-rows">
        {finding.verdict !== 'hits' && (
          <Row name="gap" note={finding.motions.length > 0 ? 'at least, over the whole way' : undefined}>
            <Gap mm={finding.gapAtLeast} display={display} />
          </Row>
        )}
        <Row name="needs" note={origin}>
          <Length mm={finding.required} display={display} options={{ denominator: 32, rounding: 'up' }} />
        </Row>
        <Row name="tolerance" note="of the two parts">
          <Length mm={shares[0]!} display={display} options={{ denominator: 32, rounding: 'up' }} />
          {' + '}
          <Length mm={shares[1]!} display={display} options={{ denominator: 32, rounding: 'up' }} />
        </Row>
        {finding.margin < 0 ? (
          <Row name="lacks">
            <Length mm={-finding.margin} display={display} options={{ denominator: 32, rounding: 'up' }} />
          </Row>
        ) : (
          <Row name="to spare">
            <Gap mm={finding.margin} display={display} />
          </Row>
        )}
      </dl>
      {others.length > 0 && (
        <details className="finding-others">
          <summary>
            {others.length === 1 ? 'Another finding' : `${others.length} other findings`} of the same two parts
          </summary>
          <ul>
            {others.map((f) => (
              <li key={findingKey(f)}>
                <button type="button" className="rung rung-plain" onClick={() => openFinding(bench, f)}>
                  <span className="rung-name">{where(scene, f)}</span>
                  <Reading finding={f} />
                </button>
              </li>
            ))}
          </ul>
        </details>
      )}
    </section>
  );
}
