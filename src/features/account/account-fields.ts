// What the forms of the door take, with the sentence for each fault.
import { z } from 'zod';
import { LEAST_PASSWORD } from '../../lib/auth-calls';

export const emailField = z
  .string()
  .trim()
  .max(320, 'A mail address has at most 320 characters.')
  .pipe(z.email('Type a mail address, like name@shop.example.'));

export const nameField = z.string().trim().min(1, 'Type your name.').max(120, 'A name has at most 120 characters.');

/** For signing in: whatever was good once. */
export const passwordField = z
  .string()
  .min(1, 'Type your password.')
  .max(200, 'A password has at most 200 characters.');

export const newPasswordField = z
  .string()
  .min(LEAST_PASSWORD, `Use ${LEAST_PASSWORD} characters or more.`)
  .max(200, 'A password has at most 200 characters.');
