// The facts of a project, as its forms take them.
import { z } from 'zod';
import { DISPLAYS } from './display-labels';

export const factsSchema = z.object({
  name: z.string().trim().min(1, 'Give the project a name.').max(120, 'A name has at most 120 characters.'),
  car: z.string().trim().max(200, 'At most 200 characters.'),
  display: z.enum(DISPLAYS),
  notes: z.string().trim().max(5000, 'At most 5,000 characters.'),
});
export type Facts = z.infer<typeof factsSchema>;

export const FIRST_SCENE = 'Layout 1';
