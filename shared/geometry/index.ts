// The door of the kernel: shapes, paths and the gap between them. It knows nothing of cars.
export { isInside, inBox, piecePoints, windingNumber } from './contain';
export { CONTACT, GapMeter, roundingOf } from './gap';
export type { Gap } from './gap';
export { meshExtent, meshFromSoup, meshFromStl } from './mesh';
export type { Mesh, MeshResult } from './mesh';
export { displacementAt, pathOf, STILL, stepTravel } from './path';
export type { Path, PathStep, Triple } from './path';
export type { Range, Settled, Side, Witness } from './search';
export { boxShape, cylinderShape, indexMesh, meshShape, shapeBox } from './shape';
export type { IndexedMesh, MeshShape, Placed, Shape } from './shape';
export { MAX_MESH_BYTES, MAX_MESH_TRIANGLES, readStl } from './stl';
export { segmentDistance, triangleDistance } from './triangle-distance';
