// The pictures of findings: those that are stored, and those that this browser draws now, one by one.
import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { readPicture, storePicture, type Picture } from '#shared/api';
import { findingKey, type Finding } from '#shared/check';
import { addressOf } from '../../lib/api';
import { revisionQuery } from '../../lib/queries/dry-fits';
import { uploadFile } from '../../lib/upload';
import { picturedFindings } from './finding-groups';
import type { PictureState } from './finding-picture';
import type { ReportModel } from './report-model';

/** Pictures are taken of so many findings at most, the worst. */
const MOST = 24;

export type DrawFinding = (finding: Finding) => Promise<{ readonly blob: Blob }>;

export interface FindingPictures {
  readonly of: (key: string) => PictureState;
  /** How many are still to be drawn; 0: none, and nothing needs to be set up to draw them. */
  readonly awaited: number;
  readonly wanted: number;
  readonly hasFailed: boolean;
  /** To be called with a way to draw, as soon as there is one. */
  readonly start: (draw: DrawFinding) => void;
  readonly fail: () => void;
  readonly retry: () => void;
}

/** @param mayTake whether this person may take pictures at all */
export function useFindingPictures({ revision, report }: ReportModel, mayTake: boolean): FindingPictures {
  const queryClient = useQueryClient();
  const [hasFailed, setFailed] = useState(false);
  const stored = new Map(revision.pictures.flatMap((p) => (p.findingKey === null ? [] : [[p.findingKey, p.id]])));
  const worst = picturedFindings(report.findings, MOST);
  const left = mayTake ? worst.filter((f) => !stored.has(findingKey(f))) : [];
  const { id: revisionId } = revision;
  const stop = useRef<AbortController | null>(null);
  useEffect(() => () => stop.current?.abort(), []);

  const leftNow = useRef(left);
  useEffect(() => {
    leftNow.current = left;
  });

  const start = useCallback(
    (draw: DrawFinding) => {
      if (stop.current !== null && !stop.current.signal.aborted) return;
      const control = new AbortController();
      stop.current = control;
      const note = (picture: Picture): void => {
        queryClient.setQueryData(revisionQuery(revisionId).queryKey, (known) =>
          known === undefined ? known : { ...known, pictures: [...known.pictures, picture] },
        );
      };
      void drawAll(draw, leftNow.current, revisionId, control.signal, note).then(
        () => {
          if (stop.current === control) stop.current = null;
        },
        () => {
          if (!control.signal.aborted) setFailed(true);
          if (stop.current === control) stop.current = null;
        },
      );
    },
    [queryClient, revisionId],
  );
  const fail = useCallback(() => setFailed(true), []);

  return {
    of: (key) => {
      const id = stored.get(key);
      if (id !== undefined) return { kind: 'there', url: addressOf(readPicture, { pictureId: id }) };
      const isAwaited = !hasFailed && left.some((f) => findingKey(f) === key);
      return isAwaited ? { kind: 'awaited' } : { kind: 'none' };
    },
    awaited: hasFailed ? 0 : left.length,
    wanted: worst.length,
    hasFailed: hasFailed && left.length > 0,
    start,
    fail,
    retry: () => setFailed(false),
  };
}

/** Room for the page between two drawings, ms. */
const BREATH = 60;

async function drawAll(
  draw: DrawFinding,
  findings: readonly Finding[],
  revisionId: string,
  signal: AbortSignal,
  note: (picture: Picture) => void,
): Promise<void> {
  for (const finding of findings) {
    await new Promise((resolve) => setTimeout(resolve, BREATH));
    if (signal.aborted) return;
    const { blob } = await draw(finding);
    const query = { kind: 'finding', findingKey: findingKey(finding), standpoint: 'witness mark' } as const;
    note(await uploadFile(storePicture, { params: { revisionId }, query, signal }, blob, { name: 'finding.png' }));
  }
}
