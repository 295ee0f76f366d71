// From nothing to a scene on the bench in one form: the team if there is none, the project, its first scene.
import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useRef } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { createProject, createScene, createTeam } from '#shared/api';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { Hole } from '../../components/hole';
import { Select, TextField } from '../../components/text-field';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { displayFor, useMe } from '../../lib/me';
import { shownInPlace } from '../../lib/query-client';
import { DISPLAY_LABEL, DISPLAYS } from './display-labels';
import { factsSchema, FIRST_SCENE } from './facts-schema';

const schema = factsSchema.pick({ name: true, car: true, display: true }).extend({
  team: z.string().trim().min(1, 'Give your shop or group a name.').max(120, 'A name has at most 120 characters.'),
});
type FirstJobFields = z.infer<typeof schema>;

export interface FirstJobProps {
  /** The team it is for; null: one is made as well. */
  readonly teamId: string | null;
}

export function FirstJob({ teamId }: FirstJobProps) {
  const me = useMe();
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  // what was made before a later step failed is not made twice
  const made = useRef<{ teamId?: string; projectId?: string }>({});
  const begin = useMutation({
    mutationFn: async ({ team, name, car, display }: FirstJobFields) => {
      const home = teamId ?? made.current.teamId ?? (await callApi(createTeam, { body: { name: team } })).id;
      made.current.teamId = home;
      const projectId =
        made.current.projectId ??
        (await callApi(createProject, { params: { teamId: home }, body: { name, car, display } })).id;
      made.current.projectId = projectId;
      return callApi(createScene, { params: { projectId }, body: { name: FIRST_SCENE } });
    },
    onSuccess: async (scene) => {
      await queryClient.invalidateQueries({ queryKey: ['me'] });
      await navigate(`/scenes/${scene.id}`);
      await queryClient.invalidateQueries({ queryKey: ['team'] });
    },
    meta: shownInPlace,
  });
  const { register, handleSubmit, formState } = useForm<FirstJobFields>({
    resolver: zodResolver(schema),
    defaultValues: {
      team: `${me.name.split(' ')[0] ?? me.name}’s shop`,
      name: '',
      car: '',
      display: displayFor(me, null, 'in'),
    },
  });
  const { errors } = formState;
  return (
    <section aria-label="Your first job card" className="cut max-w-3xl [--cut:26px]">
      <header className="flex items-center gap-4 border-b-2 border-strong px-5 py-3 sm:px-7">
        <Hole ring className="!h-3.5 !w-3.5" />
        <h2 className="text-xl font-extrabold">Your first job card</h2>
      </header>
      <form
        className="grid gap-x-8 gap-y-4 px-5 pt-5 pb-6 sm:grid-cols-2 sm:px-7"
        noValidate
        onSubmit={(event) => void handleSubmit((fields) => begin.mutate(fields))(event)}
      >
        {teamId === null && (
          <TextField
            label="Your shop, or your group of friends"
            hint="It owns the projects. You can invite others later."
            error={errors.team?.message}
            className="sm:col-span-2"
            {...register('team')}
          />
        )}
        <TextField
          label="Which car is it?"
          hint="A name for the project: “Blue pickup”."
          error={errors.name?.message}
          {...register('name')}
        />
        <TextField
          label="The car, in your own words"
          optional
          hint="Body, year, which side the driver sits."
          error={errors.car?.message}
          {...register('car')}
        />
        <Select label="Lengths are shown in" error={errors.display?.message} {...register('display')}>
          {DISPLAYS.map((display) => (
            <option key={display} value={display}>
              {DISPLAY_LABEL[display]}
            </option>
          ))}
        </Select>
        <div className="sm:col-span-2">
          <FormFault text={begin.isError ? sayProblem(begin.error) : null} />
          <div className="mt-1 border-t border-dashed border-line pt-4">
            <Button kind="main" type="submit" busy={begin.isPending}>
              Go to the bench
            </Button>
          </div>
        </div>
      </form>
    </section>
  );
}
