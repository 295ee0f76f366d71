// Signing in and out. The accounts' library answers in its own form; here it becomes sentences of ours.
import { z } from 'zod';
import { problemFrom, tell } from './api-problem';

export type AuthAnswer =
  { readonly ok: true } | { readonly ok: false; readonly code: string; readonly sentence: string };

export const LEAST_PASSWORD = 10;

const SENTENCES: Readonly<Record<string, string>> = {
  INVALID_EMAIL_OR_PASSWORD: 'Mail address and password do not fit together. Check both, or choose a new password.',
  EMAIL_NOT_VERIFIED: 'This mail address is not confirmed yet. We have sent the link again: open it, then sign in.',
  INVALID_EMAIL: 'That is not a mail address. Type it like name@shop.example.',
  INVALID_PASSWORD: 'The present password is not right. Type it again.',
  PASSWORD_TOO_SHORT: `The password is too short. Use ${LEAST_PASSWORD} characters or more.`,
  PASSWORD_TOO_LONG: 'The password is too long. Use 200 characters at most.',
  INVALID_TOKEN: 'This link was used or is too old. Ask for a new one.',
  TOKEN_EXPIRED: 'This link is too old. Ask for a new one.',
  USER_ALREADY_EXISTS: 'There is an account with this mail address already. Sign in instead.',
  USER_ALREADY_EXISTS_USE_ANOTHER_EMAIL: 'There is an account with this mail address already. Sign in instead.',
};

/** The sentence for a code that came in an address, or null. */
export const sentenceForCode = (code: string): string | null => SENTENCES[code.toUpperCase()] ?? null;

const libraryAnswer = z.object({ code: z.string(), message: z.string().optional() });

const UNREACHABLE: AuthAnswer = {
  ok: false,
  code: 'network/unreachable',
  sentence: 'The server could not be reached. Check the connection and try again.',
};
const TOO_OFTEN: AuthAnswer = {
  ok: false,
  code: 'rate/limited',
  sentence: 'That was too often in a short time. Wait a minute and try again.',
};

async function post(path: string, body: Readonly<Record<string, unknown>>): Promise<AuthAnswer> {
  let response: Response;
  let answer: unknown;
  try {
    response = await fetch(`/api/auth${path}`, {
      method: 'POST',
      credentials: 'same-origin',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(body),
    });
    answer = await response.json().catch(() => null);
  } catch {
    return UNREACHABLE;
  }
  if (response.ok) return { ok: true };
  const own = libraryAnswer.safeParse(answer);
  const sentence = own.success ? sentenceForCode(own.data.code) : null;
  if (own.success && sentence !== null) return { ok: false, code: own.data.code, sentence };
  if (response.status === 429 && !own.success) return TOO_OFTEN;
  const problem = problemFrom(response.status, answer);
  return { ok: false, code: problem.code, sentence: tell(problem).sentence };
}

/** Whether somebody is signed in at all; for pages that are open to everybody. */
export async function hasSession(): Promise<boolean> {
  try {
    const response = await fetch('/api/auth/get-session', { credentials: 'same-origin' });
    return response.ok && (await response.json()) !== null;
  } catch {
    return false;
  }
}

/** The page that a confirming link comes back to. */
const confirmedPath = (back: string): string =>
  back === '/' ? '/confirmed' : `/confirmed?back=${encodeURIComponent(back)}`;

export const signIn = (email: string, password: string, back: string): Promise<AuthAnswer> =>
  post('/sign-in/email', { email, password, callbackURL: confirmedPath(back) });

export const signUp = (name: string, email: string, password: string, back: string): Promise<AuthAnswer> =>
  post('/sign-up/email', { name, email, password, callbackURL: confirmedPath(back) });

export const signOut = (): Promise<AuthAnswer> => post('/sign-out', {});

export const sendConfirmation = (email: string, back: string): Promise<AuthAnswer> =>
  post('/send-verification-email', { email, callbackURL: confirmedPath(back) });

export const requestReset = (email: string): Promise<AuthAnswer> =>
  post('/request-password-reset', { email, redirectTo: '/reset' });

export const resetPassword = (token: string, newPassword: string): Promise<AuthAnswer> =>
  post('/reset-password', { token, newPassword });

/** Ends the person's other sessions as well. */
export const changePassword = (currentPassword: string, newPassword: string): Promise<AuthAnswer> =>
  post('/change-password', { currentPassword, newPassword, revokeOtherSessions: true });
