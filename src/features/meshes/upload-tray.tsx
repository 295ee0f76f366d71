import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useId, useRef, useState, type DragEvent } from 'react';
import { Button } from '../../components/button';
import { MeshMark } from '../../components/pictograms';
import { ProgressBar } from '../../components/progress-bar';
import { ErrorState } from '../../components/states';
import { notify } from '../../components/toast';
import { formatBytes } from '../../lib/format';
import { useUploads, type Upload } from './upload-store';

/** Leaving the whole site would stop what is under way. */
function useLeaveWarning(isBusy: boolean): void {
  useEffect(() => {
    if (!isBusy) return undefined;
    const warn = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isBusy]);
}

const carriesFiles = (event: DragEvent): boolean => event.dataTransfer.types.includes('Files');

/** Where meshes are brought in: a tray to drop files on, with a button for those who do not drag. */
export function UploadTray({ teamId }: { readonly teamId: string }) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [isOver, setOver] = useState(false);
  const { uploads, add, drop } = useUploads();
  const queryClient = useQueryClient();
  const mine = uploads.filter((upload) => upload.teamId === teamId);
  useLeaveWarning(uploads.some((upload) => upload.state !== 'failed'));

  const bring = (files: FileList | null): void => {
    if (files === null || files.length === 0) return;
    add(teamId, [...files], (mesh, isNew) => {
      notify({ text: isNew ? `“${mesh.name}” is taken in.` : `The team has this file already, as “${mesh.name}”.` });
      void queryClient.invalidateQueries({ queryKey: ['team', teamId, 'meshes'] });
    });
  };
  return (
    <div className="mb-8">
      <div
        className={`flex flex-wrap items-center gap-x-5 gap-y-3 border-2 border-dashed p-5 ${isOver ? 'border-laser bg-lift' : 'border-line'}`}
        onDragOver={(event) => {
          if (!carriesFiles(event)) return;
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={(event) => {
          if (!carriesFiles(event)) return;
          event.preventDefault();
          setOver(false);
          bring(event.dataTransfer.files);
        }}
      >
        <MeshMark className="!h-9 !w-9 text-soft" strokeWidth={1} />
        <div className="grow basis-60">
          <p className="font-bold">{isOver ? 'Let go to bring it in' : 'Bring in STL files'}</p>
          <p className="text-sm text-soft" id={`${id}-hint`}>
            From a scanner or a supplier, up to 256 MB each. Drop them here, or choose them.
          </p>
        </div>
        <input
          ref={input}
          type="file"
          accept=".stl,model/stl,application/sla"
          multiple
          className="sr-only"
          tabIndex={-1}
          aria-hidden="true"
          data-testid="mesh-file"
          onChange={(event) => {
            bring(event.target.files);
            // the same file may be chosen again
            event.target.value = '';
          }}
        />
        <Button kind="main" aria-describedby={`${id}-hint`} onClick={() => input.current?.click()}>
          Choose files
        </Button>
      </div>
      {mine.length > 0 && (
        <ul aria-label="Uploads" className="mt-4 grid gap-4">
          {mine.map((upload) => (
            <li key={upload.id}>
              <UploadLine upload={upload} onDrop={() => drop(upload.id)} />
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}

function UploadLine({ upload, onDrop }: { readonly upload: Upload; readonly onDrop: () => void }) {
  const { name, bytes, sent, state, problem } = upload;
  if (state === 'failed') {
    return (
      <ErrorState
        sentence={problem?.startsWith(name) === true ? problem : `“${name}” was not taken in.`}
        detail={problem?.startsWith(name) === true ? null : problem}
        action={
          <Button size="small" onClick={onDrop}>
            Put away
          </Button>
        }
      />
    );
  }
  if (state === 'waiting') return <ProgressBar label={name} share={0} note="waits its turn" onCancel={onDrop} />;
  return state === 'reading' ? (
    <ProgressBar label={name} share={null} note="is being read and judged" onCancel={onDrop} />
  ) : (
    <ProgressBar
      label={name}
      share={bytes === 0 ? null : sent / bytes}
      note={`${formatBytes(sent)} of ${formatBytes(bytes)}`}
      onCancel={onDrop}
    />
  );
}
