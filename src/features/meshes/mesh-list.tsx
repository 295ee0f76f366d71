import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { SearchField } from '../../components/search-field';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { Head, SortHead, Table } from '../../components/table';
import { Select } from '../../components/text-field';
import { tell } from '../../lib/api-problem';
import { countOf } from '../../lib/format';
import { displayFor, useMe, useWords } from '../../lib/me';
import { meshesQuery } from '../../lib/queries/meshes';
import { MeshRow } from './mesh-row';
import { UnitQuestion } from './unit-question';

const SORTS = ['created', 'name', 'triangles'] as const;
type Sort = (typeof SORTS)[number];

export interface MeshListProps {
  readonly teamId: string;
  readonly mayChange: boolean;
}

/** The team's meshes; those that still wait for their unit come first. */
export function MeshList({ teamId, mayChange }: MeshListProps) {
  const display: LengthDisplay = displayFor(useMe(), null, 'in');
  const say = useWords();
  const [params, setParams] = useSearchParams();
  const search = params.get('search') ?? '';
  const sort = SORTS.find((each) => each === params.get('sort')) ?? 'created';
  const set = (name: string, value: string): void =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        if (value === '') next.delete(name);
        else next.set(name, value);
        return next;
      },
      { replace: true },
    );
  const meshes = useQuery(meshesQuery(teamId, { search, sort }));
  const all = meshes.data ?? [];
  const waiting = mayChange ? all.filter((mesh) => mesh.unit === null) : [];
  const listed = all.filter((mesh) => !waiting.includes(mesh));
  const isNone = meshes.isSuccess && all.length === 0;
  if (isNone && search === '') {
    return (
      <EmptyState title="No mesh yet">
        {mayChange
          ? say(
              'Scan a fender liner, or ask the maker of your pedal box for an STL file. Boxes and cylinders need no file: they are made on the bench.',
            )
          : 'A designer of the team brings them in.'}
      </EmptyState>
    );
  }
  return (
    <>
      {waiting.length > 0 && (
        <div className="mb-8 grid gap-4">
          {waiting.map((mesh) => (
            <UnitQuestion key={mesh.sha256} mesh={mesh} display={display} />
          ))}
        </div>
      )}
      <div className="mb-4 grid max-w-md gap-3">
        <SearchField label="Search the meshes" value={search} onSearch={(text) => set('search', text)} />
        {/* where the table has no head to sort by */}
        <Select
          label="Order"
          labelHidden
          className="sm:!hidden"
          value={sort}
          onChange={(event) => set('sort', event.target.value === 'created' ? '' : event.target.value)}
        >
          <option value="created">last brought in</option>
          <option value="name">by name</option>
          <option value="triangles">most triangles</option>
        </Select>
      </div>
      {meshes.isPending && <LoadingState what="the meshes" />}
      {meshes.isError && <ErrorState {...tell(meshes.error)} onRetry={() => void meshes.refetch()} />}
      {isNone && (
        <EmptyState
          title={`No mesh fits “${search}”`}
          small
          action={
            <Button size="small" onClick={() => set('search', '')}>
              Show all meshes
            </Button>
          }
        />
      )}
      <p role="status" className="sr-only">
        {meshes.isSuccess && countOf(listed.length, 'mesh', 'meshes')}
      </p>
      {listed.length > 0 && (
        <Table
          label="Meshes of the team"
          head={
            <>
              <SortHead<Sort> label="Name" by="name" sort={sort} onSort={(by) => set('sort', by)} />
              <Head>Size</Head>
              <Head>Health</Head>
              <SortHead<Sort>
                label="Triangles"
                by="triangles"
                sort={sort}
                direction="descending"
                figures
                onSort={(by) => set('sort', by)}
              />
              <SortHead<Sort>
                label="Brought in"
                by="created"
                sort={sort}
                direction="descending"
                onSort={() => set('sort', '')}
              />
              {mayChange && (
                <Head>
                  <span className="sr-only">Actions</span>
                </Head>
              )}
            </>
          }
        >
          {listed.map((mesh) => (
            <MeshRow key={mesh.sha256} mesh={mesh} display={display} mayChange={mayChange} />
          ))}
        </Table>
      )}
    </>
  );
}
