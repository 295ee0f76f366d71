// The door of the API: one file per resource, written by hand.
import * as account from './account';
import * as dryFits from './dry-fits';
import type { Endpoint } from './endpoint';
import * as meshes from './meshes';
import * as projects from './projects';
import * as scenes from './scenes';
import * as shares from './shares';
import * as teams from './teams';

export * from './account';
export * from './display-mesh';
export * from './dry-fits';
export { nameField } from './endpoint';
export type { Endpoint, Method, ThingKind, Who } from './endpoint';
export * from './errors';
export * from './meshes';
export * from './projects';
export * from './scenes';
export * from './shares';
export * from './teams';

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'who' in value;
}

/** Every endpoint by name, so that a test can walk them all. */
export const ENDPOINTS: Readonly<Record<string, Endpoint>> = Object.fromEntries(
  [account, teams, projects, scenes, meshes, dryFits, shares].flatMap((resource) =>
    Object.entries(resource).filter((entry): entry is [string, Endpoint] => isEndpoint(entry[1])),
  ),
);
