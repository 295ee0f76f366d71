// Where the document stands, in words.
import { Button } from '../../../components/button';
import { useBench, useOpen } from '../bench-model';

const WORDS = {
  saved: 'saved',
  unsaved: 'saving',
  saving: 'saving',
  offline: 'offline, kept here',
  conflict: 'somebody else saved too',
  'read-only': 'to look at only',
} as const;

export function SaveWords() {
  const { session } = useBench();
  const save = useOpen((o) => o.save);
  const { kind } = save;
  return (
    <div className="save-words" data-kind={kind}>
      <span role="status">
        {WORDS[kind]}
        {kind === 'offline' && <span className="sr-only">. {save.reason}</span>}
      </span>
      {kind === 'conflict' && (
        <Button size="small" onClick={() => session.getState().set({ sheet: 'conflict' })}>
          Look at both
        </Button>
      )}
    </div>
  );
}
