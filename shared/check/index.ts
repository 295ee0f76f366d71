// The door of the check: a document and its meshes in, a report out.
export { assembleReport, checkScene, compareFindings, findingKey } from './check-scene';
export { computeFinding } from './finding';
export { planCheck } from './plan';
export type { Plan, Task } from './plan';
export { loadedMesh, meshNames, prepareScene } from './prepare';
export type { LoadedMesh, Prepared, PrepareResult, Refusal } from './prepare';
export { ENGINE_VERSION, VERDICTS } from './report';
export type { Finding, MeshEntry, MotionRef, Overlap, Report, RuleKind, Span, Verdict } from './report';
