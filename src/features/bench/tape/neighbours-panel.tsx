// What a part is jointed to, and the gap rules that are about it.
import { useState } from 'react';
import { edits, isBetween, jointsOf, type Component, type PairRule, type Scene } from '#shared/scene';
import { Button } from '../../../components/button';
import { Length } from '../../../components/fraction';
import { IconButton } from '../../../components/icon-button';
import { LengthField } from '../../../components/length-field';
import { CrossMark } from '../../../components/pictograms';
import { Select } from '../../../components/text-field';
import { useBench, useFacts, useOpen } from '../bench-model';
import { nameOf } from '../../../lib/finding-words';
import { originOf, sideWords } from '../../../lib/rule-words';
import { useSelection } from '../use-selection';

/** What the joint of two parts allows until somebody says otherwise, mm. */
const USUAL_ALLOW = 1;

export function NeighboursPanel() {
  const { main } = useSelection();
  return main === null ? null : <Neighbours key={main.id} part={main} />;
}

const concerns = (scene: Scene, part: Component, rule: PairRule): boolean =>
  rule.joint === undefined &&
  rule.between.some(
    (side) =>
      ('component' in side && side.component === part.id) ||
      ('group' in side && side.group === part.group) ||
      ('category' in side && side.category === part.category),
  );

function Neighbours({ part }: { readonly part: Component }) {
  const { open, session } = useBench();
  const { display, words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const joints = jointsOf(scene, part.id);
  const rules = scene.rules.pairs.filter((rule) => concerns(scene, part, rule));
  const { apply } = open.getState();
  return (
    <div className="tape-joints">
      <h3>Jointed to</h3>
      {joints.length === 0 && <p className="text-soft">Nothing. Parts that are bolted, welded or hinged may touch.</p>}
      <ul>
        {joints.map(({ other, allow }) => (
          <li key={other} className="joint-row">
            <span className="joint-name">{nameOf(scene, other)}</span>
            <LengthField
              label={`Overlap allowed with ${nameOf(scene, other)}`}
              labelHidden
              look="measure"
              display={display}
              value={allow}
              least={0}
              disabled={!canEdit}
              onCommit={(mm) => apply(edits.setJoint(scene, part.id, other, mm))}
            />
            {canEdit && (
              <IconButton
                label={`Take the joint with ${nameOf(scene, other)} away`}
                onClick={() => apply(edits.setJoint(scene, part.id, other, null))}
              >
                <CrossMark />
              </IconButton>
            )}
          </li>
        ))}
      </ul>
      {joints.length > 0 && <p className="tape-small">The length is how far the two may overlap at rest.</p>}
      {canEdit && <AddJoint part={part} />}
      <h3>Gap rules about it</h3>
      <ul className="tape-rules">
        {rules.map((rule) => {
          const [a, b] = rule.between;
          return (
            <li key={`${sideWords(scene, a, words)}|${sideWords(scene, b, words)}`}>
              <span>
                {sideWords(scene, a, words)} to {sideWords(scene, b, words)}
              </span>
              <Length mm={rule.gap ?? 0} display={display} className="font-bold" />
              <span className="tape-small">{originOf(rule)}</span>
            </li>
          );
        })}
        {rules.length === 0 && <li className="text-soft">Only the general gaps.</li>}
      </ul>
      <Button size="small" onClick={() => session.getState().set({ sheet: 'rules' })}>
        All gap rules
      </Button>
    </div>
  );
}

function AddJoint({ part }: { readonly part: Component }) {
  const { open } = useBench();
  const scene = useOpen((o) => o.scene);
  const [other, setOther] = useState('');
  const free = scene.components.filter(
    (c) =>
      c.id !== part.id &&
      !scene.rules.pairs.some(
        (r) => r.joint !== undefined && isBetween(r, { component: part.id }, { component: c.id }),
      ),
  );
  if (free.length === 0) return null;
  return (
    <div className="joint-add">
      <Select label="Joint it to" value={other} onChange={(event) => setOther(event.target.value)}>
        <option value="">choose a part</option>
        {free.map((c) => (
          <option key={c.id} value={c.id}>
            {c.name}
          </option>
        ))}
      </Select>
      <Button
        size="small"
        disabled={other === ''}
        onClick={() => {
          open.getState().apply(edits.setJoint(scene, part.id, other, USUAL_ALLOW));
          setOther('');
        }}
      >
        Add the joint
      </Button>
    </div>
  );
}
