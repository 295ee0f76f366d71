import { useState } from 'react';
import type { MeshLine, MeshUnit } from '#shared/api';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { sayProblem } from '../../lib/api-problem';
import { formatCount } from '../../lib/format';
import { MeshHealth } from './mesh-health';
import { MeshPicture } from './mesh-picture';
import { UnitChoice, unitName } from './unit-choice';
import { useChangeMesh } from './use-change-mesh';

export interface UnitQuestionProps {
  readonly mesh: MeshLine;
  readonly display: LengthDisplay;
}

/** A mesh whose unit nobody has said yet: without it it has no size, and cannot go to the bench. */
export function UnitQuestion({ mesh, display }: UnitQuestionProps) {
  const [unit, setUnit] = useState<MeshUnit>(mesh.guess);
  const change = useChangeMesh(mesh);
  return (
    <section
      aria-label={`Unit of ${mesh.name}`}
      className="cut grid gap-5 p-4 [--paper-edge:var(--laser)] sm:grid-cols-[11rem_1fr] sm:p-5"
    >
      <MeshPicture mesh={mesh} className="h-36 w-full" />
      <div className="grid gap-3">
        <div>
          <h3 className="text-lg font-extrabold break-all">{mesh.name}</h3>
          <p className="flex flex-wrap items-baseline gap-x-2">
            <span className="text-soft">{formatCount(mesh.triangles)} triangles,</span> <MeshHealth mesh={mesh} />
          </p>
        </div>
        <UnitChoice mesh={mesh} value={unit} display={display} onChange={setUnit} />
        <FormFault text={change.isError ? sayProblem(change.error) : null} />
        <div>
          <Button kind="main" busy={change.isPending} onClick={() => change.mutate({ unit })}>
            It is in {unitName(unit)}
          </Button>
        </div>
      </div>
    </section>
  );
}
