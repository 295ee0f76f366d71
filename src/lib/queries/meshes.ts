import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listMeshes, listProjectMeshes, readMesh } from '#shared/api';
import { callApi } from '../api';

type MeshListQuery = z.input<typeof listMeshes.query>;

export const meshesQuery = (teamId: string, query: MeshListQuery) =>
  queryOptions({
    queryKey: ['team', teamId, 'meshes', query],
    queryFn: ({ signal }) => callApi(listMeshes, { params: { teamId }, query, signal }),
    placeholderData: keepPreviousData,
  });

export const projectMeshesQuery = (projectId: string) =>
  queryOptions({
    queryKey: ['project', projectId, 'meshes'],
    queryFn: ({ signal }) => callApi(listProjectMeshes, { params: { projectId }, signal }),
  });

/** One mesh of a team; it changes only by being renamed or given a unit. */
export const meshQuery = (teamId: string, sha256: string) =>
  queryOptions({
    queryKey: ['team', teamId, 'mesh', sha256],
    queryFn: ({ signal }) => callApi(readMesh, { params: { teamId, sha256 }, signal }),
    staleTime: 60_000,
  });
