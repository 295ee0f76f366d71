// The head of the bench: whose car, which scene, whether it is saved, and what can be done with the whole of it.
import { useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { edits } from '#shared/scene';
import { Hint } from '../../../components/hint';
import { IconButton } from '../../../components/icon-button';
import { NameDialog } from '../../../components/name-dialog';
import { Wordmark } from '../../../components/wordmark';
import { useBench, useFacts, useOpen } from '../bench-model';
import { KeysMark, RedoMark, UndoMark } from './marks';
import { SaveWords } from './save-words';
import { UnitSwitch } from './unit-switch';

export function TopBar({ actions }: { readonly actions?: ReactNode }) {
  const { session } = useBench();
  const { projectName, projectId } = useFacts();
  return (
    <header className="bench-top">
      <Link to="/" aria-label="Gapwright, to your teams" className="bench-wordmark">
        <Wordmark className="text-xl" />
      </Link>
      <div className="bench-names">
        <Link to={`/projects/${projectId}`}>{projectName}</Link>
        <span aria-hidden="true" className="text-soft">
          /
        </span>
        <SceneName />
      </div>
      <SaveWords />
      <div className="bench-deeds">
        <UndoRedo />
        <UnitSwitch />
        <IconButton label="Keys" onClick={() => session.getState().set({ sheet: 'keys' })}>
          <KeysMark />
        </IconButton>
        {actions}
      </div>
    </header>
  );
}

function SceneName() {
  const { open } = useBench();
  const name = useOpen((o) => o.scene.name);
  const canEdit = useOpen((o) => o.canEdit);
  const [isRenaming, setRenaming] = useState(false);
  if (!canEdit) return <h1>{name}</h1>;
  return (
    <>
      <h1>
        <Hint text="Rename the scene">
          <button type="button" className="bench-scene-name" onClick={() => setRenaming(true)}>
            {name}
          </button>
        </Hint>
      </h1>
      <NameDialog
        open={isRenaming}
        onOpenChange={setRenaming}
        title="Rename the scene"
        label="Name of the scene"
        start={name}
        action="Rename"
        busy={false}
        fault={null}
        onSend={(next) => {
          setRenaming(false);
          const { scene, apply } = open.getState();
          if (next !== scene.name) apply(edits.setName(scene, next));
        }}
      />
    </>
  );
}

function UndoRedo() {
  const { open } = useBench();
  const canEdit = useOpen((o) => o.canEdit);
  const undoLabel = useOpen((o) => o.undoLabel);
  const redoLabel = useOpen((o) => o.redoLabel);
  if (!canEdit) return null;
  return (
    <>
      <IconButton
        label={undoLabel === null ? 'Nothing to undo' : `Undo: ${undoLabel}`}
        disabled={undoLabel === null}
        onClick={() => open.getState().undo()}
      >
        <UndoMark />
      </IconButton>
      <IconButton
        label={redoLabel === null ? 'Nothing to redo' : `Redo: ${redoLabel}`}
        disabled={redoLabel === null}
        onClick={() => open.getState().redo()}
      >
        <RedoMark />
      </IconButton>
    </>
  );
}
