import { zodResolver } from '@hookform/resolvers/zod';
import { useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { ROLE_MEANING, ROLES } from '#shared/access';
import { invite } from '#shared/api';
import { Button } from '../../components/button';
import { CheckBox } from '../../components/choice';
import { FormFault } from '../../components/form-fault';
import { Select, TextField } from '../../components/text-field';
import { notify } from '../../components/toast';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { projectsQuery } from '../../lib/queries/projects';
import { shownInPlace } from '../../lib/query-client';

const schema = z.object({
  email: z
    .string()
    .trim()
    .max(320, 'A mail address has at most 320 characters.')
    .pipe(z.email('Type a mail address, like name@shop.example.')),
  role: z.enum(ROLES),
  projects: z.array(z.string()).max(50, 'Choose 50 projects at most.'),
});
type InviteFields = z.infer<typeof schema>;

const NOBODY: InviteFields = { email: '', role: 'designer', projects: [] };

/** Sends an invitation. A guest is told at once which projects it is for. */
export function InviteForm({ teamId }: { readonly teamId: string }) {
  const queryClient = useQueryClient();
  const { register, control, handleSubmit, reset, formState } = useForm<InviteFields>({
    resolver: zodResolver(schema),
    defaultValues: NOBODY,
  });
  const role = useWatch({ control, name: 'role' });
  const projects = useInfiniteQuery({ ...projectsQuery(teamId, { limit: 100 }), enabled: role === 'guest' });
  const send = useMutation({
    mutationFn: (fields: InviteFields) =>
      callApi(invite, {
        params: { teamId },
        body: { ...fields, projects: fields.role === 'guest' ? fields.projects : [] },
      }),
    onSuccess: (invitation) => {
      reset(NOBODY);
      notify({ text: `An invitation is on its way to ${invitation.email}.` });
      void queryClient.invalidateQueries({ queryKey: ['team', teamId, 'invitations'] });
    },
    meta: shownInPlace,
  });
  const offered = projects.data?.pages.flatMap((page) => page.projects) ?? [];
  const { errors } = formState;
  return (
    <form
      className="grid gap-4"
      noValidate
      onSubmit={(event) => void handleSubmit((fields) => send.mutate(fields))(event)}
    >
      <TextField
        label="Mail address"
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...register('email')}
      />
      <Select label="Role" hint={ROLE_MEANING[role]} error={errors.role?.message} {...register('role')}>
        {ROLES.map((each) => (
          <option key={each} value={each}>
            {each}
          </option>
        ))}
      </Select>
      {role === 'guest' && offered.length > 0 && (
        <fieldset>
          <legend className="mb-1 text-sm font-semibold">May read these projects</legend>
          <div className="grid max-h-52 gap-1 overflow-y-auto">
            {offered.map((project) => (
              <CheckBox key={project.id} label={project.name} value={project.id} {...register('projects')} />
            ))}
          </div>
          {errors.projects?.message !== undefined && (
            <p role="alert" className="text-sm font-semibold text-hits">
              {errors.projects.message}
            </p>
          )}
        </fieldset>
      )}
      <FormFault text={send.isError ? sayProblem(send.error) : null} />
      <div>
        <Button kind="main" type="submit" busy={send.isPending}>
          Invite
        </Button>
      </div>
    </form>
  );
}
