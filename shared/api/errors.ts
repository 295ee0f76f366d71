// The catalogue of errors: one code, one status, one sentence that says what happened and what to do. Answers carry them as
// problem details (RFC 9457).
import { z } from 'zod';

export const ERRORS = {
  'request/invalid': [400, 'Something in the request is not as it must be. See the details and send it again.'],
  'request/too-large': [413, 'The request is larger than the server takes.'],
  'request/not-json': [415, 'The request must be JSON.'],
  'request/forbidden-origin': [403, 'The request came from another site and was not carried out.'],
  'session/missing': [401, 'You are not signed in. Sign in and try again.'],
  'access/denied': [403, 'Your role in this team does not allow that. Ask an owner of the team.'],
  'thing/missing': [
    404,
    'There is nothing here, or it is not yours to see. Check the address, or ask who sent it to you.',
  ],
  'rate/limited': [429, 'That was too often in a short time. Wait a minute and try again.'],
  'server/failed': [
    500,
    'The server failed and changed nothing. Try again; if it stays, tell whoever runs it the request number.',
  ],
  'server/busy': [503, 'The server is just stopping or starting. Try again in a moment.'],
  'team/last-owner': [409, 'A team keeps at least one owner. Make somebody else an owner first.'],
  'team/name-differs': [409, 'The name you typed is not the name of the team. Nothing was deleted.'],
  'person/already-member': [409, 'This person is in the team already. Change the role on the people page instead.'],
  'invitation/pending': [409, 'This address has an open invitation already. Send it again or withdraw it.'],
  'invitation/ended': [410, 'This invitation was withdrawn, used or is too old. Ask for a new one.'],
  'invitation/other-address': [403, 'This invitation went to another mail address. Sign in with that one.'],
  'person/not-guest': [409, 'Only guests are added to projects; other roles see all of them.'],
  'project/deleted': [410, 'This project was deleted. It can be brought back from the list of projects for 30 days.'],
  'scene/newer': [409, 'Somebody else has saved this scene since. Your changes are kept here; see both and choose.'],
  'scene/refused': [422, 'The scene would not be valid, so it was not saved. See the details.'],
  'scene/deleted': [410, 'This scene was deleted. It can be brought back from the project page for 30 days.'],
  'scene/mesh-missing': [422, 'The scene uses a mesh that the team does not have. Upload the mesh first.'],
  'scene/empty': [422, 'There is nothing to check yet: a dry fit needs at least two parts.'],
  'mesh/refused': [422, 'The file was not taken. See the reason; nothing of it was kept.'],
  'mesh/too-large': [413, 'The file is larger than 256 MB. Thin the mesh out and upload it again.'],
  'mesh/no-file': [400, 'No file came with the request. Choose an STL file.'],
  'mesh/in-use': [409, 'A scene uses this mesh. Take it out of the scene first.'],
  'dry-fit/ended': [409, 'This dry fit has ended already.'],
  'dry-fit/not-done': [409, 'The dry fit is not done yet. Wait for it, or start it again.'],
  'picture/refused': [422, 'The picture was not taken: it must be a PNG of at most 16 MB.'],
  'share/revoked': [410, 'This link was revoked. Ask the person who posted it for a new one.'],
} as const satisfies Record<string, readonly [number, string]>;

export type ErrorCode = keyof typeof ERRORS;

export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  code: z.string(),
  /** What in particular, for the person. */
  detail: z.string().optional(),
  /** The request's number, to be found in the log. */
  instance: z.string().optional(),
  /** Faults of single fields, by path. */
  faults: z.array(z.object({ path: z.string(), reason: z.string() })).optional(),
  /** More for the client's use, by code. */
  data: z.unknown().optional(),
});
export type Problem = z.infer<typeof problemSchema>;

export function statusOf(code: ErrorCode): number {
  return ERRORS[code][0];
}

export function sentenceOf(code: ErrorCode): string {
  return ERRORS[code][1];
}
