import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { changeMe, type Me } from '#shared/api';
import { Button } from '../../components/button';
import { Choice } from '../../components/choice';
import { FormFault } from '../../components/form-fault';
import { Length } from '../../components/fraction';
import { Section } from '../../components/page-head';
import { TextField } from '../../components/text-field';
import { notify } from '../../components/toast';
import { useHeld } from '../../components/use-held';
import { callApi } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { useMe } from '../../lib/me';
import { meQuery } from '../../lib/queries/account';
import { shownInPlace } from '../../lib/query-client';
import { nameField } from './account-fields';

type Change = Partial<Pick<Me, 'name' | 'display' | 'words'>>;

function useChangeMe(meta?: typeof shownInPlace) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (change: Change) => callApi(changeMe, { body: change }),
    onSuccess: (me) => {
      queryClient.setQueryData(meQuery().queryKey, me);
      notify({ text: 'Saved.' });
    },
    ...(meta === undefined ? {} : { meta }),
  });
}

const schema = z.object({ name: nameField });

export function NameSetting() {
  const me = useMe();
  const change = useChangeMe(shownInPlace);
  const { register, handleSubmit, formState } = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    values: { name: me.name },
  });
  return (
    <Section title="Name">
      <form
        className="grid max-w-md gap-3"
        noValidate
        onSubmit={(event) => void handleSubmit((fields) => change.mutate(fields))(event)}
      >
        <TextField
          label="Your name"
          hint="As your teams read it beside what you did."
          autoComplete="name"
          error={formState.errors.name?.message}
          {...register('name')}
        />
        <p className="text-sm text-soft">
          Mail address: <span className="break-all">{me.email}</span>
        </p>
        <FormFault text={change.isError ? sayProblem(change.error) : null} />
        <div>
          <Button type="submit" busy={change.isPending} disabled={!formState.isDirty}>
            Save the name
          </Button>
        </div>
      </form>
    </Section>
  );
}

/** 5 3/8 inches, to show what a choice does. */
const SAMPLE = 136.525;

type DisplayChoice = 'project' | 'in' | 'in-decimal' | 'mm';

export function UnitSetting() {
  const me = useMe();
  const change = useChangeMe();
  const [display, hold, letGo] = useHeld(me.display);
  return (
    <Section title="Lengths">
      <Choice<DisplayChoice>
        legend="How lengths are shown to you, in every project"
        name="display"
        value={display ?? 'project'}
        onChange={(value) => {
          const next = value === 'project' ? null : value;
          hold(next);
          change.mutate({ display: next }, { onError: letGo });
        }}
        options={[
          { value: 'project', label: 'As each project has it' },
          { value: 'in', label: <Sample text="Inches and fractions" display="in" /> },
          { value: 'in-decimal', label: <Sample text="Inches with decimals" display="in-decimal" /> },
          { value: 'mm', label: <Sample text="Millimetres" display="mm" /> },
        ]}
      />
      <p className="mt-2 text-sm text-soft">You may type either anywhere, whatever is chosen here.</p>
    </Section>
  );
}

const Sample = ({ text, display }: { readonly text: string; readonly display: 'in' | 'in-decimal' | 'mm' }) => (
  <>
    {text}, <Length mm={SAMPLE} display={display} className="font-semibold" />
  </>
);

export function WordSetting() {
  const me = useMe();
  const change = useChangeMe();
  const [words, hold, letGo] = useHeld(me.words);
  return (
    <Section title="Names of parts">
      <Choice
        legend="What the parts of a car are called"
        name="words"
        value={words}
        onChange={(next) => {
          hold(next);
          change.mutate({ words: next }, { onError: letGo });
        }}
        options={[
          { value: 'us', label: 'Hood, cowl, firewall, fender', hint: 'as in the United States' },
          { value: 'uk', label: 'Bonnet, scuttle, bulkhead, wing', hint: 'as in the United Kingdom' },
        ]}
      />
    </Section>
  );
}
