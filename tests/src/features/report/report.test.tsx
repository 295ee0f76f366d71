// @vitest-environment happy-dom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Finding, Report as ReportFile } from '#shared/check';
import { CAUTIONS } from '#shared/review';
import { canonicalSceneText, type Scene } from '#shared/scene';
import { strokeWords } from '../../../../src/components/stroke-track';
import { keptSceneQuery } from '../../../../src/lib/queries/dry-fits';
import { Report } from '../../../../src/features/report/report';
import { readRevisionReport } from '../../../../src/features/report/report-model';
import type { FindingPictures } from '../../../../src/features/report/use-finding-pictures';
import { finding, smallScene } from '../bench/support';

// what is in the cache is all there is to know
beforeEach(() => vi.stubGlobal('fetch', () => new Promise(() => undefined)));
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const hit: Finding = finding('brake-pedal', 'column', 'hits', {
  motions: [{ component: 'brake-pedal', motion: 'stroke' }],
  at: {
    positions: [0.42],
    points: [
      [0, 0, 0],
      [0, 0, 0],
    ],
    solids: ['body', 'body'],
  },
  hitSpans: [[0.41, 0.43]],
  tightSpans: [[0.3, 0.6]],
  overlap: { volume: null, pushOut: { vector: [15.8, 0, 6.3], length: 17 } },
});

function reportOf(findings: readonly Finding[]): ReportFile {
  const totals = { hits: 0, tight: 0, loose: 0, seated: 0, clears: 0 };
  for (const { verdict } of findings) totals[verdict] += 1;
  return {
    format: 'gapwright-report',
    version: 1,
    engine: '1.0.0',
    scene: { name: 'Layout 1', sha256: '0'.repeat(64) },
    accuracy: 0.05,
    meshes: [{ mesh: 'a'.repeat(64), sha256: 'a'.repeat(64), kind: 'sheet', triangles: 90, badEdges: 14 }],
    totals,
    unchecked: [['brake-pedal', 'firewall']],
    findings,
  };
}

const NO_PICTURES: FindingPictures = {
  of: () => ({ kind: 'none' }),
  awaited: 0,
  wanted: 0,
  hasFailed: false,
  start: () => undefined,
  fail: () => undefined,
  retry: () => undefined,
};

function show(findings: readonly Finding[], now: Scene = smallScene()): void {
  const scene = smallScene();
  const read = readRevisionReport({
    id: 'r',
    sceneId: 's',
    projectId: 'p',
    teamId: 't',
    projectName: 'Harbour Lane pickup',
    projectDisplay: 'in',
    number: 7,
    saveNumber: 31,
    sha256: 'b'.repeat(64),
    madeBy: 'Dag',
    createdAt: '2026-05-14T16:20:00.000Z',
    notOnThisCar: ['booster'],
    document: JSON.parse(canonicalSceneText(scene)),
    report: reportOf(findings),
    dryFit: null,
    pictures: [],
  });
  if (!read.ok) throw new Error(read.why);
  const client = new QueryClient({ defaultOptions: { queries: { retry: false, staleTime: Infinity } } });
  client.setQueryData(keptSceneQuery('s').queryKey, {
    sceneId: 's',
    teamId: 't',
    projectId: 'p',
    projectName: 'Harbour Lane pickup',
    projectDisplay: 'in',
    saveNumber: 32,
    saveId: null,
    canEdit: true,
    document: JSON.parse(canonicalSceneText(now)),
  });
  render(
    <QueryClientProvider client={client}>
      <MemoryRouter>
        <Report model={read.model} display="in" words="uk" crumbs={[]} pictures={NO_PICTURES} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

describe('an interference report', () => {
  it('opens with one sentence: pair, number, pose, and what would change it', () => {
    show([hit]);
    const said = screen.getByRole('region', { name: 'In one sentence' }).textContent.replace(/\s+/g, ' ');
    expect(said).toMatch(/Brake pedal hits Column/);
    expect(said).toMatch(/42 % of “Brake stroke”/);
    expect(said).toMatch(/moving Brake pedal .* rearward and .* up frees this pair/);
  });

  it('calls the roll: what is missing first, with the pedal box that hangs on nothing, in the reader’s words', () => {
    show([hit]);
    const roll = screen.getByRole('region', { name: 'Roll-call' });
    expect(within(roll).getByText('exhaust')).toBeDefined();
    expect(within(roll).getByText('Pedal box').parentElement?.textContent).toMatch(/the bulkhead or the scuttle/);
    expect(within(roll).getByText(/brake booster/).textContent).toMatch(/not on this car/);
  });

  it('names what was not checked: open surfaces and jointed pairs', () => {
    show([hit]);
    const part = screen.getByRole('region', { name: 'What was not checked' });
    expect(part.textContent).toMatch(/14 torn or folded edges/);
    expect(within(part).getByText('Brake pedal, Firewall')).toBeDefined();
  });

  it('leads from a finding to its witness mark', () => {
    show([hit]);
    const link = screen.getByRole<HTMLAnchorElement>('link', { name: 'Brake pedal, Column' });
    expect(decodeURIComponent(link.getAttribute('href') ?? '')).toBe(
      '/scenes/s?finding=brake-pedal|column|brake-pedal.stroke',
    );
  });

  it('says a pair that may lie inside a broken scan before everything else', () => {
    show([hit, finding('column', 'wiper', 'clears', { insideSheet: true })]);
    const opening = screen.getByRole('region', { name: 'In one sentence' });
    expect(opening.firstElementChild?.textContent).toMatch(/^One pair may lie one inside the other/);
  });

  it('narrows the list by verdict and shows all again', () => {
    show([hit, finding('clutch-pedal', 'column', 'tight')]);
    fireEvent.click(screen.getByRole('button', { name: /1\s*tight/ }));
    expect(screen.queryByRole('link', { name: 'Brake pedal, Column' })).toBeNull();
    expect(screen.getByRole('link', { name: 'Clutch pedal, Column' })).toBeDefined();
    fireEvent.click(screen.getByRole('button', { name: 'all' }));
    expect(screen.getByRole('link', { name: 'Brake pedal, Column' })).toBeDefined();
  });

  it('says that the scene has gone on, and for which parts', () => {
    const now = smallScene();
    show([hit], {
      ...now,
      components: now.components.map((c) => (c.id === 'wiper' ? { ...c, tolerance: 9 } : c)),
    });
    expect(screen.getByText(/The scene has changed since/).parentElement?.textContent).toMatch(/for Wiper/);
  });

  it('holds its tongue while the scene is what was checked', () => {
    show([hit]);
    expect(screen.queryByText(/The scene has changed since/)).toBeNull();
  });

  it('carries every caution', () => {
    show([]);
    for (const caution of CAUTIONS) expect(screen.getByText(caution)).toBeDefined();
  });
});

describe('a stroke in words', () => {
  it('says stretches, single places and silence', () => {
    expect(strokeWords([[0.41, 0.43]], [[0.3, 0.6]])).toBe('hits from 41 % to 43 %, tight from 30 % to 60 %');
    expect(strokeWords([[0.5, 0.5]], [])).toBe('hits at 50 %');
    expect(strokeWords([], [])).toBe('clears all the way');
  });
});
