// The door of access: the role table.
export { ACTIONS, can, mayShow, ROLE_MEANING, ROLES } from './can';
export type { Action, Role, Standing, Verdict } from './can';
