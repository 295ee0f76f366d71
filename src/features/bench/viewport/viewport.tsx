// The scene, full-bleed, with the marks that lie over it.
import { Canvas } from '@react-three/fiber';
import { Component, useState, type ReactNode } from 'react';
import { inWords } from '../../../lib/part-words';
import { useFacts, useSession } from '../bench-model';
import { Overlay } from '../overlay/overlay';
import { STANDPOINT_NAME } from '../standpoints/standpoints';
import { NoViewport } from './no-viewport';
import { StageView } from './stage-view';

export interface ViewportProps {
  /** Edges without steps cost time; small pictures and tests do without. */
  readonly antialias?: boolean;
  readonly children?: ReactNode;
}

export function Viewport({ antialias = true, children }: ViewportProps) {
  const [isLost, setLost] = useState(false);
  const { words } = useFacts();
  const standpoint = useSession((s) => s.standpoint);
  const from = standpoint === null ? '' : `, ${inWords(STANDPOINT_NAME[standpoint], words)}`;
  const label = `The scene in 3D${from}. Tags, tape and gaps say in words what it shows.`;
  return (
    <div className="bench-viewport">
      <Canvas
        role="img"
        aria-label={label}
        frameloop="demand"
        flat
        dpr={[1, 2]}
        gl={{ antialias, powerPreference: 'high-performance' }}
        onCreated={({ gl }) => {
          gl.domElement.addEventListener('webglcontextlost', () => setLost(true));
          gl.domElement.addEventListener('webglcontextrestored', () => setLost(false));
        }}
      >
        <StageView />
      </Canvas>
      {isLost ? (
        <NoViewport why="lost" />
      ) : (
        <>
          <Overlay />
          {children}
        </>
      )}
    </div>
  );
}

interface BoundaryProps {
  readonly fallback: ReactNode;
  readonly children: ReactNode;
}

/** Drawing may fail where the rest works: the rest stays. */
export class ViewportBoundary extends Component<BoundaryProps, { readonly failed: boolean }> {
  override state = { failed: false };
  static getDerivedStateFromError(): { readonly failed: boolean } {
    return { failed: true };
  }
  override render(): ReactNode {
    return this.state.failed ? this.props.fallback : this.props.children;
  }
}
