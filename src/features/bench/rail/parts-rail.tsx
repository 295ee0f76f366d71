// The parts rail: every part as a shop tag, in the order in which they are fitted.
import { useEffect, useRef, useState, type RefObject } from 'react';
import { edits } from '#shared/scene';
import { useBench, useOpen, useSession } from '../bench-model';
import { clickPart } from '../click-part';
import { useWorstOf } from '../use-findings';
import { useSelection } from '../use-selection';
import type { Presence } from '../session';
import { clustersOf, movedTo, orderOf, type Cluster } from './clusters';
import { MissingTags } from './missing-tags';
import { PartTag } from './part-tag';
import { RollCallStrip } from './roll-call-strip';
import { useTagDrag } from './use-tag-drag';

const NEXT: Readonly<Record<Presence | 'whole', Presence | null>> = { whole: 'faded', faded: 'off', off: null };

export function PartsRail() {
  const bench = useBench();
  const { open, session } = bench;
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const rail = useRef<HTMLDivElement>(null);
  const [said, setSaid] = useState('');
  const clusters = clustersOf(scene);
  const order = orderOf(clusters);
  const reorder = (id: string, place: number): void => {
    const next = movedTo(order, id, place);
    if (next.join() === order.join()) return;
    open.getState().apply(edits.reorderComponents(open.getState().scene, next));
    const name = scene.components.find((c) => c.id === id)?.name ?? id;
    setSaid(`${name} is now number ${place + 1} of ${order.length} in the fitting order.`);
  };
  const { drag, handlers } = useTagDrag(rail, canEdit, reorder);
  useKeepInSight(rail);
  return (
    <section className="rail" aria-label="Parts, in the order in which they are fitted">
      <div className="rail-head">
        <RollCallStrip />
        <span className="rail-hint">
          {scene.groups.length > 0 ? 'A second click on a tag takes its whole group.' : ''}
        </span>
      </div>
      <div
        className="rail-row"
        ref={rail}
        onWheel={(event) => {
          if (event.deltaX === 0) event.currentTarget.scrollLeft += event.deltaY;
        }}
      >
        {clusters.map((cluster) => (
          <RailCluster
            key={cluster.key}
            cluster={cluster}
            dragged={drag?.id ?? null}
            dropBefore={drag === null ? null : (order.filter((id) => id !== drag.id)[drag.place] ?? null)}
            shift={drag?.x ?? 0}
            handlers={handlers}
            onKeyMove={(id, by) => reorder(id, order.indexOf(id) + by)}
            canEdit={canEdit}
          />
        ))}
        <MissingTags />
        {canEdit && (
          <button type="button" className="tag-plus" onClick={() => session.getState().set({ sheet: 'shelf' })}>
            <span aria-hidden="true">+</span> part
          </button>
        )}
      </div>
      <p className="sr-only" aria-live="polite">
        {said}
      </p>
    </section>
  );
}

interface RailClusterProps {
  readonly cluster: Cluster;
  readonly dragged: string | null;
  /** The tag that a dragged one would be put before. */
  readonly dropBefore: string | null;
  readonly shift: number;
  readonly handlers: ReturnType<typeof useTagDrag>['handlers'];
  readonly onKeyMove: (id: string, by: number) => void;
  readonly canEdit: boolean;
}

function RailCluster({ cluster, dragged, dropBefore, shift, handlers, onKeyMove, canEdit }: RailClusterProps) {
  const bench = useBench();
  const worst = useWorstOf();
  const selection = useSelection();
  const presence = useSession((s) => s.presence);
  const hovered = useSession((s) => s.hovered);
  const { set, setPresence } = bench.session.getState();
  const isMeant = selection.group !== null && selection.group === cluster.group;
  return (
    <div className="cluster" data-meant={isMeant || undefined}>
      <p className="cluster-label">
        {cluster.label}
        {isMeant && <span> {'\u00b7'} all together</span>}
      </p>
      <ul className="cluster-tags">
        {cluster.parts.map((part) => (
          <li
            key={part.id}
            data-drop={dropBefore === part.id || undefined}
            style={dragged === part.id ? { transform: `translateX(${shift}px)`, zIndex: 2 } : undefined}
            onKeyDown={(event) => {
              if (!canEdit || !event.altKey || (event.key !== 'ArrowLeft' && event.key !== 'ArrowRight')) return;
              event.preventDefault();
              event.stopPropagation();
              onKeyMove(part.id, event.key === 'ArrowLeft' ? -1 : 1);
            }}
            onContextMenu={(event) => {
              event.preventDefault();
              if (!selection.ids.includes(part.id)) clickPart(bench, part.id, false);
              set({ menuAt: { x: event.clientX, y: event.clientY } });
            }}
            {...handlers(part.id)}
          >
            <PartTag
              part={part}
              worst={worst.get(part.id)}
              isChosen={selection.ids.includes(part.id)}
              goesAlong={selection.moving.has(part.id) && !selection.ids.includes(part.id)}
              isHovered={hovered === part.id}
              presence={presence[part.id]}
              onChoose={(adds) => clickPart(bench, part.id, adds)}
              onEye={() => setPresence([part.id], NEXT[presence[part.id] ?? 'whole'])}
              onPoint={(isOver) => set({ hovered: isOver ? part.id : null })}
            />
          </li>
        ))}
      </ul>
    </div>
  );
}

/** A part that is selected in the scene brings its tag into sight. */
function useKeepInSight(rail: RefObject<HTMLElement | null>): void {
  const main = useSelection().main?.id ?? null;
  useEffect(() => {
    if (main === null) return;
    const tag = rail.current?.querySelector(`[data-part="${main}"]`);
    tag?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  }, [main, rail]);
}
