// The bench: the scene full-bleed, and around it the standpoints, the parts rail, the tape and the gap ladder.
import { useMemo, type ReactNode } from 'react';
import { CutawayBar } from './cutaway/cutaway-bar';
import { EmptyBench } from './empty-bench';
import { Handles } from './handles/handles';
import { KeysSheet } from './keys/keys-sheet';
import { useKeys } from './keys/use-keys';
import { LasersSheet } from './lasers/lasers-sheet';
import { GapList } from './ladder/gap-list';
import { Ladder } from './ladder/ladder';
import { NarrowBench } from './narrow-bench';
import { PartMenu } from './part-menu';
import { PartsRail } from './rail/parts-rail';
import { RulesSheet } from './rules/rules-sheet';
import { Shelf } from './shelf/shelf';
import { StandpointBar } from './standpoints/standpoint-bar';
import { Tape } from './tape/tape';
import { TapeLeader } from './tape/tape-leader';
import { ConflictDialog } from './top-bar/conflict-dialog';
import { TopBar } from './top-bar/top-bar';
import { useIsNarrow } from './use-is-narrow';
import { useStartFinding } from './use-start-finding';
import { useWantedMeshes } from './use-wanted-meshes';
import { InsetsContext, type Insets } from './viewport/insets';
import { NoViewport } from './viewport/no-viewport';
import { Viewport, ViewportBoundary } from './viewport/viewport';
import { hasWebGl2 } from './viewport/webgl';
import { useOpen } from './bench-model';
import './styles/bench.css';
import './styles/ladder.css';
import './styles/rail.css';
import './styles/sheets.css';
import './styles/tape.css';

export interface BenchProps {
  /** Buttons of the top bar that belong to others: taking a picture, running a dry fit. */
  readonly actions?: ReactNode;
  /** Key of the finding to open the bench at. */
  readonly startFinding?: string | null;
}

const WIDE: Insets = { left: 24, right: 368, top: 150, bottom: 150 };
const NARROW: Insets = { left: 0, right: 0, top: 104, bottom: 170 };

export function Bench({ actions, startFinding = null }: BenchProps) {
  const isNarrow = useIsNarrow();
  const canDraw = useMemo(() => hasWebGl2(), []);
  const isEmpty = useOpen((o) => o.scene.components.length === 0);
  useKeys();
  useWantedMeshes();
  useStartFinding(startFinding);
  return (
    <InsetsContext value={isNarrow ? NARROW : WIDE}>
      <div className="bench on-dye" data-narrow={isNarrow || undefined}>
        <TopBar actions={actions} />
        <main id="main" tabIndex={-1} className="bench-main">
          {canDraw ? (
            <ViewportBoundary fallback={<NoViewport why="failed" />}>
              <Viewport>
                <Handles />
                <TapeLeader />
              </Viewport>
            </ViewportBoundary>
          ) : (
            <NoViewport why="missing" />
          )}
          {isEmpty && <EmptyBench />}
          {canDraw && (
            <>
              <StandpointBar />
              <CutawayBar />
            </>
          )}
          {isNarrow ? (
            <NarrowBench />
          ) : (
            <>
              <Tape />
              <PartsRail />
              <Ladder />
            </>
          )}
        </main>
        <PartMenu />
        <Shelf />
        <RulesSheet />
        <LasersSheet />
        <GapList />
        <KeysSheet />
        <ConflictDialog />
      </div>
    </InsetsContext>
  );
}
