import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useCallback, useMemo, useRef, useState } from 'react';
import { useParams } from 'react-router-dom';
import { decodeDisplayMesh, readSharedMesh } from '#shared/api';
import type { Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { ErrorState, LoadingState } from '../components/states';
import { Wordmark } from '../components/wordmark';
import { SharedGone } from '../features/shares/shared-gone';
import { sharedFindings, sharedScene, type SharedRevision } from '../features/shares/shared-scene';
import { SharedSheet } from '../features/shares/shared-sheet';
import { fetchFile } from '../lib/api';
import { isProblem, localProblem, sayProblem, tell } from '../lib/api-problem';
import { inWords, type WordChoice } from '../lib/part-words';
import { sharedQuery } from '../lib/queries/shares';
import { usePageTitle } from '../lib/use-page-title';

const StaticSceneView = lazy(async () => ({
  default: (await import('../features/bench/scene-view/static-scene-view')).StaticSceneView,
}));

export function Component() {
  const { token = '' } = useParams();
  const shared = useQuery(sharedQuery(token));
  const { data } = shared;
  usePageTitle(
    data === undefined ? 'Shared revision' : `${data.projectName}: ${data.sceneName}, revision ${data.number}`,
  );
  if (data !== undefined) return <Shared key={token} token={token} shared={data} />;
  if (isProblem(shared.error, 'share/revoked')) return <SharedGone why="revoked" />;
  if (isProblem(shared.error, 'thing/missing', 'request/invalid')) return <SharedGone why="unknown" />;
  return (
    <div className="on-card min-h-dvh bg-ground">
      <main id="main" tabIndex={-1} className="mx-auto max-w-2xl px-4 py-10">
        <h1 className="mb-4 text-3xl">
          <Wordmark />
        </h1>
        {shared.isError ? (
          <ErrorState {...tell(shared.error)} onRetry={() => void shared.refetch()} />
        ) : (
          <LoadingState what="what was shared" />
        )}
      </main>
    </div>
  );
}

/** Readers are not known: their browser's language tells which names of parts they use. */
const readersWords = (): WordChoice => (/^en-(GB|IE|AU|NZ|ZA)/i.test(navigator.language) ? 'uk' : 'us');

function Shared({ token, shared }: { readonly token: string; readonly shared: SharedRevision }) {
  const [display, setDisplay] = useState<LengthDisplay>(shared.display);
  const [words] = useState(readersWords);
  const scene = useMemo(() => sharedScene(shared), [shared]);
  const [show, setShow] = useState<((finding: Finding) => void) | null>(null);
  const plate = useRef<HTMLDivElement>(null);
  const onReady = useCallback((ready: (finding: Finding) => void) => setShow(() => ready), []);
  const onFinding =
    show === null
      ? null
      : (finding: Finding): void => {
          show(finding);
          plate.current?.scrollIntoView({ block: 'nearest', behavior: 'smooth' });
        };
  return (
    <SharedSheet
      token={token}
      shared={shared}
      scene={scene}
      display={display}
      onDisplay={setDisplay}
      say={(text) => inWords(text, words)}
      onFinding={onFinding}
      drawing={
        scene !== null && (
          <div ref={plate}>
            <Drawing token={token} shared={shared} scene={scene} display={display} words={words} onReady={onReady} />
          </div>
        )
      }
    />
  );
}

interface DrawingProps {
  readonly token: string;
  readonly shared: SharedRevision;
  readonly scene: Scene;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  readonly onReady: (show: (finding: Finding) => void) => void;
}

function Drawing({ token, shared, scene, display, words, onReady }: DrawingProps) {
  const loadMesh = async (index: string) => {
    const mesh = decodeDisplayMesh(await fetchFile(readSharedMesh, { token, index }));
    if (mesh === null) throw localProblem('answer/unreadable');
    return mesh;
  };
  return (
    <Suspense fallback={<LoadingState what="the scene" />}>
      <StaticSceneView
        scene={scene}
        findings={sharedFindings(shared)}
        loadMesh={loadMesh}
        say={sayProblem}
        display={display}
        words={words}
        onReady={onReady}
      />
    </Suspense>
  );
}
