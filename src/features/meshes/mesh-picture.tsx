import { queryOptions, useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { decodeDisplayMesh, readDisplayMesh, type MeshLine } from '#shared/api';
import { fetchFile } from '../../lib/api';
import { drawMesh } from './draw-mesh';

const WIDTH = 176;
const HEIGHT = 112;

const displayMeshQuery = (teamId: string, sha256: string) =>
  queryOptions({
    queryKey: ['display-mesh', teamId, sha256],
    queryFn: async ({ signal }) => {
      const mesh = decodeDisplayMesh(await fetchFile(readDisplayMesh, { teamId, sha256 }, signal));
      if (mesh === null) throw new Error('no display mesh');
      return mesh;
    },
    // the file behind a hash never changes
    staleTime: Infinity,
    gcTime: 60_000,
    retry: 1,
  });

/** A token's colour as three numbers. */
function faceColour(element: Element): [number, number, number] {
  const hex = getComputedStyle(element).getPropertyValue('--raw-aluminium').trim();
  const value = Number.parseInt(hex.slice(1), 16);
  return Number.isNaN(value) ? [188, 196, 207] : [(value >> 16) & 255, (value >> 8) & 255, value & 255];
}

export interface MeshPictureProps {
  readonly mesh: Pick<MeshLine, 'teamId' | 'sha256' | 'name'>;
  readonly className?: string;
}

/** The mesh as it looks, fetched when it comes into sight. */
export function MeshPicture({ mesh, className }: MeshPictureProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const [isSeen, setSeen] = useState(false);
  const { data } = useQuery({ ...displayMeshQuery(mesh.teamId, mesh.sha256), enabled: isSeen });
  useEffect(() => {
    const element = canvas.current;
    if (element === null) return undefined;
    const watcher = new IntersectionObserver((entries) => {
      if (!entries.some((entry) => entry.isIntersecting)) return;
      setSeen(true);
      watcher.disconnect();
    });
    watcher.observe(element);
    return () => watcher.disconnect();
  }, []);
  useEffect(() => {
    const element = canvas.current;
    const context = element?.getContext('2d');
    if (data === undefined || !element || !context) return;
    const ground = getComputedStyle(element).getPropertyValue('--dye').trim();
    context.setTransform(2, 0, 0, 2, 0, 0);
    drawMesh(context, data, WIDTH, HEIGHT, { ground, face: faceColour(element) });
  }, [data]);
  return (
    <canvas
      ref={canvas}
      width={WIDTH * 2}
      height={HEIGHT * 2}
      role="img"
      aria-label={`Picture of ${mesh.name}`}
      className={`bg-dye object-contain ${className ?? ''}`}
    />
  );
}
