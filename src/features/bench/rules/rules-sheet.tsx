// The one table of gap rules, each row with where it comes from.
import { useState } from 'react';
import {
  CATEGORIES,
  DEFAULT_GAPS,
  DEFAULT_GENERAL,
  defaultFor,
  edits,
  patchRules,
  type Category,
  type PairRule,
  type Scene,
  type Side,
} from '#shared/scene';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { IconButton } from '../../../components/icon-button';
import { LengthField } from '../../../components/length-field';
import { CrossMark } from '../../../components/pictograms';
import { Select } from '../../../components/text-field';
import { categoryLabel } from '../../../lib/part-words';
import { useBench, useFacts, useOpen, useSession } from '../bench-model';
import { checked } from '../edits';
import { generalOrigin, originOf, sideWords } from '../../../lib/rule-words';

export function RulesSheet() {
  const { session } = useBench();
  const isOpen = useSession((s) => s.sheet === 'rules');
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) session.getState().set({ sheet: null });
      }}
      title="Gap rules"
      lead="How much room two parts need. The most particular rule that fits a pair decides. None of the figures that come with a new scene has a source: they are common practice, for you to judge."
      wide
    >
      <Rules />
    </Dialog>
  );
}

function Rules() {
  const { open } = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { apply } = open.getState();
  const gaps = scene.rules.pairs.flatMap((rule, index) => (rule.joint === undefined ? [{ rule, index }] : []));
  return (
    <>
      <table className="rules-table">
        <thead>
          <tr>
            <th scope="col">between</th>
            <th scope="col">needs</th>
            <th scope="col">where it comes from</th>
            <th scope="col">
              <span className="sr-only">change</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {(['gap', 'movingGap'] as const).map((which) => (
            <tr key={which}>
              <th scope="row">{which === 'gap' ? 'any two fixed parts' : 'a moving part and any other'}</th>
              <td>
                <LengthField
                  label={which === 'gap' ? 'Gap of fixed parts' : 'Gap of moving parts'}
                  labelHidden
                  look="measure"
                  display={display}
                  least={0}
                  value={scene.rules[which]}
                  disabled={!canEdit}
                  onCommit={(mm) => apply(edits.setGeneralGaps(scene, { [which]: mm }))}
                />
              </td>
              <td className="rules-origin">{generalOrigin(scene, which)}</td>
              <td>
                {canEdit && scene.rules[which] !== DEFAULT_GENERAL[which].value && (
                  <button
                    type="button"
                    className="button-text"
                    onClick={() => apply(edits.setGeneralGaps(scene, { [which]: DEFAULT_GENERAL[which].value }))}
                  >
                    set back
                  </button>
                )}
              </td>
            </tr>
          ))}
          {gaps.map(({ rule, index }) => (
            <RuleRow key={index} rule={rule} index={index} />
          ))}
        </tbody>
      </table>
      {canEdit && <AddRule />}
      {canEdit && (
        <div className="mt-4 border-t border-dashed border-line pt-3">
          <Button size="small" onClick={() => apply(checked('Set the gap rules back', backToTable))}>
            Set all back to the table of a new scene
          </Button>
          <p className="mt-1 text-sm text-soft">Rules of your own go; joints stay. It can be undone.</p>
        </div>
      )}
    </>
  );
}

/** The table as a new scene has it; joints stay. */
function backToTable(scene: Scene): Scene {
  return patchRules(scene, {
    gap: DEFAULT_GENERAL.gap.value,
    movingGap: DEFAULT_GENERAL.movingGap.value,
    pairs: [
      ...DEFAULT_GAPS.map(({ between: [a, b], gap }): PairRule => ({
        between: [{ category: a }, { category: b }],
        gap,
      })),
      ...scene.rules.pairs.filter((r) => r.joint !== undefined),
    ],
  });
}

function RuleRow({ rule, index }: { readonly rule: PairRule; readonly index: number }) {
  const { open } = useBench();
  const { display, words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { apply } = open.getState();
  const [a, b] = rule.between;
  const name = `${sideWords(scene, a, words)} to ${sideWords(scene, b, words)}`;
  const usual = defaultFor(rule);
  return (
    <tr>
      <th scope="row">{name}</th>
      <td>
        <LengthField
          label={`Gap, ${name}`}
          labelHidden
          look="measure"
          display={display}
          least={0}
          value={rule.gap ?? 0}
          disabled={!canEdit}
          onCommit={(mm) => apply(edits.setPairGap(scene, a, b, mm))}
        />
      </td>
      <td className="rules-origin">{originOf(rule)}</td>
      <td className="rules-deeds">
        {canEdit && usual !== null && usual.gap !== rule.gap && (
          <button type="button" className="button-text" onClick={() => apply(edits.setPairGap(scene, a, b, usual.gap))}>
            set back
          </button>
        )}
        {canEdit && (
          <IconButton label={`Take out the rule ${name}`} onClick={() => apply(edits.removeRule(scene, index))}>
            <CrossMark />
          </IconButton>
        )}
      </td>
    </tr>
  );
}

/** A side as one text, for a list to choose from. */
const sideText = (side: Side): string =>
  'component' in side
    ? `component ${side.component}`
    : 'group' in side
      ? `group ${side.group}`
      : `category ${side.category}`;

function sideOf(text: string): Side | null {
  const [kind, id] = text.split(' ');
  if (id === undefined) return null;
  if (kind === 'component') return { component: id };
  return kind === 'group' ? { group: id } : { category: id as Category };
}

function AddRule() {
  const { open } = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const [a, setA] = useState('');
  const [b, setB] = useState('');
  const [gap, setGap] = useState(scene.rules.gap);
  const [x, y] = [sideOf(a), sideOf(b)];
  return (
    <fieldset className="rules-add">
      <legend>A rule of your own</legend>
      <SideSelect label="Between" value={a} onChange={setA} />
      <SideSelect label="and" value={b} onChange={setB} />
      <LengthField label="needs" display={display} least={0} value={gap} onCommit={setGap} />
      <Button
        size="small"
        disabled={x === null || y === null}
        onClick={() => {
          if (x === null || y === null) return;
          open.getState().apply(edits.setPairGap(scene, x, y, gap));
          setA('');
          setB('');
        }}
      >
        Add it
      </Button>
    </fieldset>
  );
}

interface SideSelectProps {
  readonly label: string;
  readonly value: string;
  readonly onChange: (value: string) => void;
}

function SideSelect({ label, value, onChange }: SideSelectProps) {
  const { words } = useFacts();
  const scene = useOpen((o) => o.scene);
  return (
    <Select label={label} value={value} onChange={(event) => onChange(event.target.value)}>
      <option value="">choose</option>
      <optgroup label="Parts">
        {scene.components.map((c) => (
          <option key={c.id} value={sideText({ component: c.id })}>
            {c.name}
          </option>
        ))}
      </optgroup>
      {scene.groups.length > 0 && (
        <optgroup label="Groups">
          {scene.groups.map((g) => (
            <option key={g.id} value={sideText({ group: g.id })}>
              any of {g.name}
            </option>
          ))}
        </optgroup>
      )}
      <optgroup label="Kinds">
        {CATEGORIES.map((c) => (
          <option key={c} value={sideText({ category: c })}>
            any {categoryLabel(c, words)}
          </option>
        ))}
      </optgroup>
    </Select>
  );
}
