import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { changeProject, createProject, type Project } from '#shared/api';
import { Button } from '../../components/button';
import { Dialog, DialogActions } from '../../components/dialog';
import { FormFault } from '../../components/form-fault';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { displayFor, useMe } from '../../lib/me';
import { projectQuery } from '../../lib/queries/projects';
import { shownInPlace } from '../../lib/query-client';
import { FactsFields } from './facts-fields';
import { factsSchema, type Facts } from './facts-schema';

interface OpenProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}

interface FactsFormProps {
  readonly start: Facts;
  readonly action: string;
  readonly busy: boolean;
  readonly fault: string | null;
  readonly onSend: (facts: Facts) => void;
  readonly onLeave: () => void;
}

function FactsForm({ start, action, busy, fault, onSend, onLeave }: FactsFormProps) {
  const form = useForm<Facts>({ resolver: zodResolver(factsSchema), defaultValues: start });
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void form.handleSubmit(onSend)(event)}>
      <FactsFields form={form} />
      <FormFault text={fault} />
      <DialogActions>
        <Button kind="main" type="submit" busy={busy}>
          {action}
        </Button>
        <Button onClick={onLeave}>Leave it</Button>
      </DialogActions>
    </form>
  );
}

/** Opens a project in a team and goes there. */
export function NewProjectDialog({ teamId, open, onOpenChange }: OpenProps & { readonly teamId: string }) {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const me = useMe();
  const create = useMutation({
    mutationFn: (facts: Facts) => callApi(createProject, { params: { teamId }, body: facts }),
    onSuccess: async (project) => {
      await queryClient.invalidateQueries({ queryKey: ['team', teamId, 'projects'] });
      await navigate(`/projects/${project.id}`);
    },
    meta: shownInPlace,
  });
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="New project" lead="One car is one project.">
      <FactsForm
        start={{ name: '', car: '', display: displayFor(me, null, 'in'), notes: '' }}
        action="Open the project"
        busy={create.isPending}
        fault={create.isError ? sayProblem(create.error) : null}
        onSend={create.mutate}
        onLeave={() => onOpenChange(false)}
      />
    </Dialog>
  );
}

/** Changes a project's facts. */
export function ProjectFactsDialog({ project, open, onOpenChange }: OpenProps & { readonly project: Project }) {
  const queryClient = useQueryClient();
  const change = useMutation({
    mutationFn: (facts: Facts) => callApi(changeProject, { params: { projectId: project.id }, body: facts }),
    onSuccess: async (next) => {
      queryClient.setQueryData(projectQuery(project.id).queryKey, next);
      onOpenChange(false);
      notify({ text: 'The project’s facts are changed.' });
      await Promise.all([
        queryClient.invalidateQueries({ queryKey: ['team', project.teamId, 'projects'] }),
        queryClient.invalidateQueries({ queryKey: ['project', project.id, 'activity'] }),
      ]);
    },
    meta: shownInPlace,
  });
  const { name, car, display, notes } = project;
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="Facts of the project">
      <FactsForm
        start={{ name, car, display, notes }}
        action="Save the facts"
        busy={change.isPending}
        fault={change.isError ? sayProblem(change.error) : null}
        onSend={change.mutate}
        onLeave={() => onOpenChange(false)}
      />
    </Dialog>
  );
}
