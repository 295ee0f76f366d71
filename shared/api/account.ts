// The person who is signed in. Signing in itself is the auth library's own, under /api/auth.
import { z } from 'zod';
import { ROLES } from '#shared/access';
import { anyone, defineEndpoint, displayField, nameField, personId, rowId, signedIn, when } from './endpoint';

export const WORD_CHOICES = ['us', 'uk'] as const;

export const me = z.object({
  id: personId,
  name: z.string(),
  email: z.string(),
  /** Null: the project's or the document's unit counts. */
  display: displayField.nullable(),
  /** Names of parts as in the US or the UK. */
  words: z.enum(WORD_CHOICES),
  teams: z.array(z.object({ id: rowId, name: z.string(), role: z.enum(ROLES) })),
  /** Open invitations to the person's verified address. */
  invitations: z.array(z.object({ id: rowId, team: z.string(), role: z.enum(ROLES) })),
});
export type Me = z.infer<typeof me>;

export const readMe = defineEndpoint({ method: 'GET', path: '/me', who: signedIn, response: me });

export const changeMe = defineEndpoint({
  method: 'PATCH',
  path: '/me',
  who: signedIn,
  body: z.object({
    name: nameField.optional(),
    display: displayField.nullable().optional(),
    words: z.enum(WORD_CHOICES).optional(),
  }),
  response: me,
});

/** What the sign-in page may offer on this server. */
export const readServerFacts = defineEndpoint({
  method: 'GET',
  path: '/server',
  who: anyone,
  response: z.object({
    mode: z.enum(['local', 'production']),
    /** Whether mails can be read on a page here instead of arriving by post. */
    mailShelf: z.boolean(),
    demoAccounts: z.array(z.object({ name: z.string(), email: z.string(), password: z.string(), role: z.enum(ROLES) })),
  }),
});

export const shelvedMail = z.object({
  id: rowId,
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  sentAt: when,
});

/** Local mode only; elsewhere it is not there. */
export const listShelvedMail = defineEndpoint({
  method: 'GET',
  path: '/mail',
  who: anyone,
  query: z.object({ to: z.string().max(320).optional() }),
  response: z.array(shelvedMail),
});
