// Uploads under way. They live beside the pages, so that looking at another page does not stop them.
import { create } from 'zustand';
import { sentenceOf, uploadMesh, type MeshLine } from '#shared/api';
import { isProblem, sayProblem } from '../../lib/api-problem';
import { uploadFile } from '../../lib/upload';

export const MOST_BYTES = 256 * 1024 * 1024;

export interface Upload {
  readonly id: number;
  readonly teamId: string;
  readonly name: string;
  readonly bytes: number;
  readonly sent: number;
  readonly state: 'waiting' | 'sending' | 'reading' | 'failed';
  /** Why it failed, and what to do. */
  readonly problem: string | null;
}

interface Uploads {
  readonly uploads: readonly Upload[];
  /** Puts files in the queue; they go up one after another. */
  readonly add: (teamId: string, files: readonly File[], onTaken: Taken) => void;
  /** Stops an upload, or puts a failed one away. */
  readonly drop: (id: number) => void;
}

/** Called for each file that the team has now; `isNew` is false where it had it already. */
type Taken = (mesh: MeshLine, isNew: boolean) => void;

interface Job {
  readonly id: number;
  readonly teamId: string;
  readonly file: File;
  readonly onTaken: Taken;
  readonly stop: AbortController;
}

function createUploads() {
  const jobs: Job[] = [];
  let lastId = 0;
  let isRunning = false;

  return create<Uploads>()((set) => {
    const patch = (id: number, change: Partial<Upload>): void =>
      set(({ uploads }) => ({ uploads: uploads.map((u) => (u.id === id ? { ...u, ...change } : u)) }));
    const forget = (id: number): void => set(({ uploads }) => ({ uploads: uploads.filter((u) => u.id !== id) }));

    const send = async ({ id, teamId, file, onTaken, stop }: Job): Promise<void> => {
      try {
        patch(id, { state: 'sending' });
        const { mesh, isNew } = await uploadFile(uploadMesh, { params: { teamId }, signal: stop.signal }, file, {
          name: file.name,
          onProgress: ({ sent, total, isReading }) => {
            // the form around the file counts as well; what is shown is of the file
            const share = total > 0 ? sent / total : 0;
            patch(id, { sent: share * file.size, state: isReading ? 'reading' : 'sending' });
          },
        });
        forget(id);
        onTaken(mesh, isNew);
      } catch (error) {
        if (isProblem(error, 'network/stopped')) forget(id);
        else patch(id, { state: 'failed', problem: sayProblem(error) });
      }
    };
    const run = async (): Promise<void> => {
      if (isRunning) return;
      isRunning = true;
      for (let job = jobs.shift(); job !== undefined; job = jobs.shift()) {
        current = job;
        if (!job.stop.signal.aborted) await send(job);
      }
      current = null;
      isRunning = false;
    };
    let current: Job | null = null;

    return {
      uploads: [],
      add(teamId, files, onTaken) {
        for (const file of files) {
          lastId += 1;
          const id = lastId;
          const isTooLarge = file.size > MOST_BYTES;
          const upload: Upload = {
            id,
            teamId,
            name: file.name,
            bytes: file.size,
            sent: 0,
            state: isTooLarge ? 'failed' : 'waiting',
            problem: isTooLarge ? sentenceOf('mesh/too-large') : null,
          };
          set(({ uploads }) => ({ uploads: [...uploads, upload] }));
          if (!isTooLarge) jobs.push({ id, teamId, file, onTaken, stop: new AbortController() });
        }
        void run();
      },
      drop(id) {
        const job = current?.id === id ? current : jobs.find((j) => j.id === id);
        job?.stop.abort();
        forget(id);
      },
    };
  });
}

export const useUploads = createUploads();
