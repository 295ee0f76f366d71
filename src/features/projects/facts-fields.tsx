import type { UseFormReturn } from 'react-hook-form';
import { Select, TextArea, TextField } from '../../components/text-field';
import { DISPLAY_LABEL, DISPLAYS } from './display-labels';
import type { Facts } from './facts-schema';

/** The fields of a project's facts, for opening one and for changing it. */
export function FactsFields({ form }: { readonly form: UseFormReturn<Facts> }) {
  const { register, formState } = form;
  const { errors } = formState;
  return (
    <>
      <TextField label="Name of the project" error={errors.name?.message} {...register('name')} />
      <TextField
        label="The car, in your own words"
        optional
        hint="Body, year, which side the driver sits, what goes in."
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
      <TextArea label="Notes" optional rows={3} error={errors.notes?.message} {...register('notes')} />
    </>
  );
}
