// The menu of other actions for what is selected: by right click, by key, by the tape's button.
import { DropdownMenu } from 'radix-ui';
import { notify } from '../../components/toast';
import { MenuItem, MenuLabel, MenuRule } from '../../components/menu';
import { useBench, useOpen, useSession } from './bench-model';
import { clamp, duplicate, partGroup, remove, sayRemoved, takeOutOfGroup } from './part-deeds';
import { useSelection } from './use-selection';
import { sceneBox } from './viewport/extent';

export function PartMenu() {
  const bench = useBench();
  const at = useSession((s) => s.menuAt);
  const { set } = bench.session.getState();
  const { ids } = useSelection();
  if (at === null || ids.length === 0) return null;
  return (
    <DropdownMenu.Root
      open
      modal={false}
      onOpenChange={(open) => {
        if (!open) set({ menuAt: null });
      }}
    >
      <DropdownMenu.Trigger asChild>
        <span className="menu-anchor" style={{ left: at.x, top: at.y }} tabIndex={-1} aria-hidden="true" />
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align="start" sideOffset={2} collisionPadding={8} className="on-card cut menu">
          <Items />
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

function Items() {
  const bench = useBench();
  const { ids, main, moving, group } = useSelection();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const presence = useSession((s) => s.presence);
  const { set, setPresence } = bench.session.getState();
  const all = [...moving];
  const isFaded = all.every((id) => presence[id] === 'faded');
  const own = scene.groups.find((g) => g.id === main?.group);
  const title = group !== null ? own?.name : ids.length > 1 ? `${ids.length} parts` : main?.name;
  return (
    <>
      <MenuLabel>{title}</MenuLabel>
      <MenuItem
        onSelect={() => {
          const box = sceneBox(scene, bench.meshes, moving);
          if (box !== null) bench.view.hand()?.fit(box);
        }}
      >
        Go to it
      </MenuItem>
      <MenuItem onSelect={() => setPresence(all, isFaded ? null : 'faded')}>{isFaded ? 'Bring back' : 'Fade'}</MenuItem>
      <MenuItem onSelect={() => setPresence(all, 'off')}>Take off the bench</MenuItem>
      <MenuItem
        onSelect={() =>
          setPresence(
            scene.components.filter((c) => !moving.has(c.id)).map((c) => c.id),
            'faded',
          )
        }
      >
        Fade all others
      </MenuItem>
      {Object.keys(presence).length > 0 && (
        <MenuItem onSelect={() => set({ presence: {} })}>Bring everything back</MenuItem>
      )}
      {canEdit && (
        <>
          <MenuRule />
          <MenuItem onSelect={() => duplicate(bench)}>Duplicate</MenuItem>
          {ids.length > 1 && <MenuItem onSelect={() => clamp(bench)}>Clamp together</MenuItem>}
          {own !== undefined && ids.length === 1 && (
            <MenuItem onSelect={() => takeOutOfGroup(bench)}>Take out of {own.name}</MenuItem>
          )}
          {own !== undefined && <MenuItem onSelect={() => partGroup(bench)}>Part {own.name} again</MenuItem>}
          <MenuItem onSelect={() => set({ handles: bench.session.getState().handles === 'move' ? 'turn' : 'move' })}>
            {bench.session.getState().handles === 'move' ? 'Handles to turn' : 'Handles to move'}
          </MenuItem>
          <MenuRule />
          <MenuItem
            danger
            onSelect={() => {
              const removed = remove(bench);
              if (removed !== null) notify({ text: sayRemoved(removed.names), undo: removed.undo });
            }}
          >
            Delete
          </MenuItem>
        </>
      )}
    </>
  );
}
