// Edits of lasers, the datum planes that positions are read off.
import type { Laser, Scene, Vec3 } from './types';

export function setLasers(scene: Scene, lasers: readonly Laser[]): Scene {
  return { ...scene, lasers };
}

/** Adds a laser; nothing if its id is taken. */
export function addLaser(scene: Scene, laser: Laser): Scene {
  return scene.lasers.some((l) => l.id === laser.id) ? scene : setLasers(scene, [...scene.lasers, laser]);
}

export function removeLaser(scene: Scene, id: string): Scene {
  const lasers = scene.lasers.filter((l) => l.id !== id);
  return lasers.length === scene.lasers.length ? scene : setLasers(scene, lasers);
}

export function patchLaser(scene: Scene, id: string, patch: Partial<Omit<Laser, 'id'>>): Scene {
  if (!scene.lasers.some((l) => l.id === id)) return scene;
  return setLasers(
    scene,
    scene.lasers.map((l) => (l.id === id ? { ...l, ...patch } : l)),
  );
}

export function renameLaser(scene: Scene, id: string, name: string): Scene {
  return patchLaser(scene, id, { name });
}

/** Puts a laser through another point, mm in the car's frame, and square to another direction if one is given. */
export function moveLaser(scene: Scene, id: string, point: Vec3, normal?: Vec3): Scene {
  return patchLaser(scene, id, normal === undefined ? { point } : { point, normal });
}
