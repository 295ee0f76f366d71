// The objects of three.js for one part: a fill and a set of scribe lines for each of its bodies.
import { BufferAttribute, BufferGeometry, Group, Mesh, type ShaderMaterial } from 'three';
import type { Component, Scene } from '#shared/scene';
import { composeRigid, identityRigid, rigidFromPose } from '#shared/units';
import { bodiesOf, bodyPose, type Body, type Positions } from './bodies';
import { createFinishMaterial, setLift, wearLook } from './finish-material';
import type { SharedLight } from './light';
import type { PartLook } from './look';
import type { MeshSource } from './mesh-source';
import { toMatrix } from './rigid-matrix';
import { createScribeMaterial, scribeGeometry, setLine } from './scribe-material';
import type { Surface } from './drawn';
import { drawnSolid, mergeDrawn } from './shapes';

/** How a part stands among the others just now. */
export interface PartStanding {
  readonly look: PartLook;
  readonly isOff: boolean;
  readonly isSelected: boolean;
  readonly isHovered: boolean;
  /** Something else is being looked at. */
  readonly isBehind: boolean;
}

interface BodyObjects {
  readonly body: Body;
  readonly closed: boolean;
  readonly fill: Mesh;
  readonly fillMaterial: ShaderMaterial;
  readonly lines: Mesh;
  readonly lineMaterial: ShaderMaterial;
  /** Its chalk lines seen through whatever stands before it; made when it is first selected. */
  readonly through: Mesh;
}

/** Order of drawing: grounds, fills, lines on them, glass, lines on glass, chalk. */
export const ORDER = { ground: 0, lines: 2, glass: 4, glassLines: 5, curtain: 6, fan: 7, chalk: 8 } as const;

export interface PartObjects {
  readonly group: Group;
  /** What it was built from, to tell whether it has to be built anew. */
  readonly builtFrom: Pick<Component, 'solids' | 'motions'> & { readonly meshVersion: number };
  readonly bodies: readonly BodyObjects[];
}

function surfaceGeometry({ positions, normals, index }: Surface): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(positions, 3));
  geometry.setAttribute('normal', new BufferAttribute(normals, 3));
  geometry.setIndex(new BufferAttribute(index, 1));
  return geometry;
}

export function buildPart(
  component: Component,
  meshes: MeshSource,
  light: SharedLight,
  through: ShaderMaterial,
): PartObjects {
  const group = new Group();
  group.name = component.id;
  group.matrixAutoUpdate = false;
  const bodies = bodiesOf(component).flatMap((body): BodyObjects[] => {
    const parts = body.solids.flatMap((i) => {
      const solid = component.solids[i]!;
      const drawn = drawnSolid(solid, meshes);
      const pose = rigidFromPose(solid.pose?.at, solid.pose?.turn);
      return drawn === null ? [] : [{ drawn, pose: composeRigid(identityRigid(), pose) }];
    });
    if (parts.length === 0) return [];
    const { surface, scribe, closed } = mergeDrawn(parts);
    const fillMaterial = createFinishMaterial(light);
    const fill = new Mesh(surfaceGeometry(surface), fillMaterial);
    const lineMaterial = createScribeMaterial(light, { colour: 'scribe', width: 1, opacity: 0.8 });
    const lines = new Mesh(scribeGeometry(scribe), lineMaterial);
    const behind = new Mesh(lines.geometry, through);
    behind.renderOrder = ORDER.chalk;
    behind.visible = false;
    for (const object of [fill, lines, behind]) {
      object.matrixAutoUpdate = false;
      group.add(object);
    }
    // the box of two triangles says nothing about where its lines are
    lines.frustumCulled = false;
    behind.frustumCulled = false;
    return [{ body, closed, fill, fillMaterial, lines, lineMaterial, through: behind }];
  });
  const { solids, motions } = component;
  return { group, bodies, builtFrom: { solids, motions, meshVersion: meshes.version() } };
}

export function placePart(part: PartObjects, scene: Scene, component: Component, positions: Positions): void {
  for (const { body, fill, lines, through } of part.bodies) {
    toMatrix(bodyPose(scene, component, body, positions), fill.matrix);
    fill.matrixWorldNeedsUpdate = true;
    for (const object of [lines, through]) {
      object.matrix.copy(fill.matrix);
      object.matrixWorldNeedsUpdate = true;
    }
  }
}

function lineOf({ look, isSelected, isHovered, isBehind }: PartStanding): Parameters<typeof setLine>[1] {
  if (isSelected) return { colour: 'chalk', width: 2, opacity: 1 };
  if (isHovered) return { colour: 'scribe', width: 1.7, opacity: 1 };
  const faint = look.presence === 'faded' || isBehind;
  if (faint) return { colour: 'scribe-soft', width: 0.9, opacity: look.presence === 'faded' ? 0.28 : 0.4 };
  return { colour: 'scribe', width: 1.1, opacity: look.presence === 'glass' ? 0.6 : 0.82 };
}

export function dressPart(part: PartObjects, standing: PartStanding, isCut: boolean): void {
  part.group.visible = !standing.isOff;
  const { isSelected, isHovered, isBehind, look } = standing;
  const worn: PartLook = isBehind && look.presence === 'whole' ? { ...look, presence: 'faded' } : look;
  const isVeiled = worn.presence !== 'whole';
  for (const { closed, fill, fillMaterial, lines, lineMaterial, through } of part.bodies) {
    wearLook(fillMaterial, worn, closed, isCut);
    setLift(fillMaterial, isHovered ? 1 : 0);
    setLine(lineMaterial, lineOf(standing));
    fill.renderOrder = isVeiled ? ORDER.glass : 0;
    lines.renderOrder = isSelected ? ORDER.chalk : isVeiled ? ORDER.glassLines : ORDER.lines;
    through.visible = isSelected;
  }
}

export function disposePart(part: PartObjects): void {
  part.group.removeFromParent();
  for (const { fill, fillMaterial, lines, lineMaterial } of part.bodies) {
    fill.geometry.dispose();
    fillMaterial.dispose();
    lines.geometry.dispose();
    lineMaterial.dispose();
  }
}
