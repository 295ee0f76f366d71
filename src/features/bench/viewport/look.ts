// How each finish takes the light, and which parts are shown as glass. Defined once for the bench, its pictures and its shelf.
import type { Category, Component } from '#shared/scene';
import { finishOf, type Finish } from '../../../lib/finishes';

export interface FinishLook {
  /** Strength and sharpness of the highlight. */
  readonly gloss: number;
  readonly sharpness: number;
  /** How much of the edge of a rounded part catches the light. */
  readonly rim: number;
}

export const FINISH_LOOK: Readonly<Record<Finish, FinishLook>> = {
  'primer-grey': { gloss: 0.05, sharpness: 8, rim: 0.1 },
  'red-oxide': { gloss: 0.06, sharpness: 10, rim: 0.12 },
  'etch-green': { gloss: 0.05, sharpness: 8, rim: 0.1 },
  'zinc-yellow': { gloss: 0.16, sharpness: 18, rim: 0.12 },
  'raw-aluminium': { gloss: 0.42, sharpness: 34, rim: 0.16 },
  'cadmium-gold': { gloss: 0.4, sharpness: 26, rim: 0.18 },
  'black-oxide': { gloss: 0.3, sharpness: 22, rim: 0.3 },
  ghost: { gloss: 0.1, sharpness: 20, rim: 0.2 },
};

/** Sheet metal, people and their seats are seen through, so that they never hide what stands behind. */
const GLASS: ReadonlySet<Category> = new Set<Category>([
  'firewall',
  'cowl',
  'toe-board',
  'floor',
  'tunnel',
  'inner-fender',
  'fender-liner',
  'hood',
  'dash',
  'seat',
  'driver',
]);

export const isGlass = (category: Category): boolean => GLASS.has(category);

/** How a part is shown just now. */
export type Presence = 'whole' | 'glass' | 'faded';

export interface PartLook {
  readonly finish: Finish;
  readonly presence: Presence;
  /** Drawn with hatching: its measures are a guess. */
  readonly guessed: boolean;
}

export function lookOf(part: Pick<Component, 'category' | 'source'>, faded: boolean): PartLook {
  return {
    finish: finishOf(part.category),
    presence: faded ? 'faded' : isGlass(part.category) ? 'glass' : 'whole',
    guessed: part.source === 'guess',
  };
}
