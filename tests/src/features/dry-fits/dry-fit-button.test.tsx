// @vitest-environment happy-dom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { DryFit } from '#shared/api';
import { HintProvider } from '../../../../src/components/hint';
import { DryFitButton } from '../../../../src/features/dry-fits/dry-fit-button';
import { endSentence, isAllClear, progressNote, shareOf } from '../../../../src/features/dry-fits/dry-fit-words';

const SCENE = '11111111-1111-4111-8111-111111111111';
const base: DryFit = {
  id: '22222222-2222-4222-8222-222222222222',
  sceneId: SCENE,
  revisionId: '33333333-3333-4333-8333-333333333333',
  number: 7,
  state: 'queued',
  done: 0,
  total: 0,
  problem: null,
  totals: null,
  startedBy: 'Dag',
  createdAt: '2026-05-14T16:20:00.000Z',
  endedAt: null,
};

let list: DryFit[] = [];
const asked: { method: string; path: string; body: unknown }[] = [];

beforeEach(() => {
  list = [];
  asked.length = 0;
  vi.stubGlobal('fetch', (path: string, init: RequestInit) => {
    const method = init.method ?? 'GET';
    asked.push({ method, path, body: typeof init.body === 'string' ? JSON.parse(init.body) : null });
    if (method === 'POST' && path.endsWith('/cancel')) list = [{ ...base, state: 'cancelled' }];
    else if (method === 'POST') list = [{ ...base, state: 'running', done: 3, total: 12 }];
    return Promise.resolve(new Response(JSON.stringify(method === 'POST' ? list[0] : list)));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(saveNow: () => Promise<number | null>, canRun = true): void {
  render(
    <QueryClientProvider client={new QueryClient()}>
      <HintProvider>
        <MemoryRouter>
          <DryFitButton sceneId={SCENE} saveNumber={31} saveNow={saveNow} canRun={canRun} />
        </MemoryRouter>
      </HintProvider>
    </QueryClientProvider>,
  );
}

describe('the button that runs a dry fit', () => {
  it('saves first, checks that very save, shows how far it is, and leads to the report', async () => {
    show(() => Promise.resolve(32));
    fireEvent.click(await screen.findByRole('button', { name: 'Run dry fit' }));
    const bar = await screen.findByRole('progressbar');
    expect(asked.find((a) => a.method === 'POST')).toMatchObject({
      path: `/api/scenes/${SCENE}/dry-fits`,
      body: { saveNumber: 32 },
    });
    expect(bar.getAttribute('aria-valuenow')).toBe('25');
    const totals = { hits: 1, tight: 0, loose: 0, seated: 2, clears: 9 };
    list = [{ ...base, state: 'done', done: 12, total: 12, totals }];
    const link = await screen.findByRole('link', { name: 'Report 7' }, { timeout: 4000 });
    expect(link.getAttribute('href')).toBe(`/revisions/${base.revisionId}/report`);
  });

  it('starts nothing where the scene could not be saved', async () => {
    show(() => Promise.resolve(null));
    fireEvent.click(await screen.findByRole('button', { name: 'Run dry fit' }));
    await waitFor(() => expect(screen.getByRole('button', { name: 'Run dry fit' })).toBeDefined());
    expect(asked.some((a) => a.method === 'POST')).toBe(false);
  });

  it('takes up one that was under way when the bench was opened, and cancels it', async () => {
    list = [{ ...base, state: 'running', done: 6, total: 12 }];
    show(() => Promise.resolve(31));
    fireEvent.click(await screen.findByRole('button', { name: 'Cancel the dry fit' }));
    await screen.findByRole('button', { name: 'Run dry fit' });
    expect(asked.some((a) => a.path.endsWith(`/dry-fits/${base.id}/cancel`))).toBe(true);
  });

  it('is not there for those who may not', () => {
    show(() => Promise.resolve(31), false);
    expect(screen.queryByRole('button')).toBeNull();
    expect(asked).toEqual([]);
  });
});

describe('a dry fit in words', () => {
  it('knows no share before anybody knows how much there is', () => {
    expect(shareOf(base)).toBeNull();
    expect(shareOf({ state: 'running', done: 0, total: 0 })).toBeNull();
    expect(shareOf({ state: 'running', done: 30, total: 40 })).toBe(0.75);
  });

  it('says how far it is and how it ended', () => {
    expect(progressNote(base)).toBe('waiting for its turn');
    expect(progressNote({ state: 'running', done: 3, total: 12 })).toBe('3 of 12 findings');
    expect(endSentence({ state: 'failed', problem: 'It ran out of memory.' })).toBe('It ran out of memory.');
    expect(endSentence({ state: 'cancelled', problem: null })).toMatch(/^Cancelled/);
  });

  it('is all clear only without a hit, a tight gap and a loose joint', () => {
    const totals = { hits: 0, tight: 0, loose: 0, seated: 4, clears: 9 };
    expect(isAllClear({ totals })).toBe(true);
    expect(isAllClear({ totals: { ...totals, loose: 1 } })).toBe(false);
    expect(isAllClear({ totals: null })).toBe(false);
  });
});
