import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { deleteMesh, type MeshLine, type MeshUnit } from '#shared/api';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { ConfirmDialog } from '../../components/confirm-dialog';
import { Dialog, DialogActions } from '../../components/dialog';
import { FormFault } from '../../components/form-fault';
import { IconButton } from '../../components/icon-button';
import { Menu, MenuItem, MenuRule } from '../../components/menu';
import { NameDialog } from '../../components/name-dialog';
import { HolesMark } from '../../components/pictograms';
import { Cell, Row } from '../../components/table';
import { notify } from '../../components/toast';
import { When } from '../../components/when';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { formatBytes, formatCount } from '../../lib/format';
import { shownInPlace } from '../../lib/query-client';
import { MeshHealth } from './mesh-health';
import { MeshPicture } from './mesh-picture';
import { MeshSize } from './mesh-size';
import { UnitChoice, unitName } from './unit-choice';
import { useChangeMesh } from './use-change-mesh';

export interface MeshRowProps {
  readonly mesh: MeshLine;
  readonly display: LengthDisplay;
  readonly mayChange: boolean;
}

export function MeshRow({ mesh, display, mayChange }: MeshRowProps) {
  const [asks, setAsks] = useState<'rename' | 'unit' | 'delete' | null>(null);
  const close = (): void => setAsks(null);
  const rename = useChangeMesh(mesh, close);
  return (
    <Row className="mesh-row">
      <Cell>
        <div className="flex items-center gap-3.5">
          <MeshPicture mesh={mesh} className="h-14 w-22 flex-none" />
          <span className="min-w-0 font-bold break-words">{mesh.name}</span>
        </div>
      </Cell>
      <Cell head="Size">
        {mesh.unit === null ? (
          <span className="text-soft">unit not said</span>
        ) : (
          <>
            <MeshSize mesh={mesh} unit={mesh.unit} display={display} />
            <span className="block text-sm text-soft">file in {unitName(mesh.unit)}</span>
          </>
        )}
      </Cell>
      <Cell head="Health">
        <MeshHealth mesh={mesh} />
      </Cell>
      <Cell head="Triangles" figures>
        {formatCount(mesh.triangles)}
        <span className="ml-2 text-sm text-soft sm:ml-0 sm:block">{formatBytes(mesh.bytes)}</span>
      </Cell>
      <Cell head="Brought in">
        {mesh.uploadedBy}
        <span className="block text-sm text-soft">
          <When iso={mesh.createdAt} />
        </span>
      </Cell>
      {mayChange && (
        <Cell className="sm:text-right">
          <Menu
            trigger={
              <IconButton label={`More for ${mesh.name}`} hint={false}>
                <HolesMark />
              </IconButton>
            }
          >
            <MenuItem onSelect={() => setAsks('rename')}>Rename</MenuItem>
            <MenuItem onSelect={() => setAsks('unit')}>Change the unit</MenuItem>
            <MenuRule />
            <MenuItem danger onSelect={() => setAsks('delete')}>
              Delete the mesh
            </MenuItem>
          </Menu>
          <NameDialog
            open={asks === 'rename'}
            onOpenChange={close}
            title="Rename the mesh"
            label="Name of the mesh"
            start={mesh.name}
            action="Rename"
            busy={rename.isPending}
            fault={rename.isError ? sayProblem(rename.error) : null}
            onSend={(name) => rename.mutate({ name })}
          />
          <UnitDialog mesh={mesh} display={display} open={asks === 'unit'} onClose={close} />
          <DeleteMeshDialog mesh={mesh} open={asks === 'delete'} onClose={close} />
        </Cell>
      )}
    </Row>
  );
}

interface AskProps {
  readonly mesh: MeshLine;
  readonly open: boolean;
  readonly onClose: () => void;
}

function UnitDialog({ mesh, display, open, onClose }: AskProps & { readonly display: LengthDisplay }) {
  const [unit, setUnit] = useState<MeshUnit>(mesh.unit ?? mesh.guess);
  const change = useChangeMesh(mesh, onClose);
  return (
    <Dialog
      open={open}
      onOpenChange={onClose}
      title={`Unit of ${mesh.name}`}
      lead="It counts from now on. Parts that stand on a bench already keep the size they have."
    >
      <UnitChoice mesh={mesh} value={unit} display={display} onChange={setUnit} />
      <FormFault text={change.isError ? sayProblem(change.error) : null} />
      <DialogActions>
        <Button kind="main" busy={change.isPending} onClick={() => change.mutate({ unit })}>
          It is in {unitName(unit)}
        </Button>
        <Button onClick={onClose}>Leave it</Button>
      </DialogActions>
    </Dialog>
  );
}

function DeleteMeshDialog({ mesh, open, onClose }: AskProps) {
  const { teamId, sha256, name } = mesh;
  const queryClient = useQueryClient();
  const remove = useMutation({
    mutationFn: () => callApi(deleteMesh, { params: { teamId, sha256 } }),
    onSuccess: () => {
      onClose();
      notify({ text: `“${name}” is deleted.` });
      return queryClient.invalidateQueries({ queryKey: ['team', teamId, 'meshes'] });
    },
    meta: shownInPlace,
  });
  return (
    <ConfirmDialog
      open={open}
      onOpenChange={() => {
        remove.reset();
        onClose();
      }}
      title={`Delete ${name}?`}
      action="Delete the mesh"
      danger
      busy={remove.isPending}
      error={remove.isError ? sayProblem(remove.error) : null}
      onConfirm={() => remove.mutate()}
    >
      <p>The file goes for good. A mesh that a scene or a revision uses cannot be deleted.</p>
    </ConfirmDialog>
  );
}
