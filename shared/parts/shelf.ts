// The shelf, in the order in which it is laid out: what cannot move first, then the pedal box, then the rest.
import { booster } from './booster';
import { cowl } from './cowl';
import { engineEnvelope } from './engine-envelope';
import { exhaustHeader } from './exhaust-header';
import { fenderLiner } from './fender-liner';
import { firewallPanel } from './firewall-panel';
import { floorPanel } from './floor-panel';
import { hangingPedal } from './hanging-pedal';
import { hardLine } from './hard-line';
import { heaterBox } from './heater-box';
import { hood } from './hood';
import { masterCylinder } from './master-cylinder';
import { pedalBracket } from './pedal-bracket';
import { reservoir } from './reservoir';
import { seat } from './seat';
import { steeringColumn } from './steering-column';
import { throttlePedal } from './throttle-pedal';
import type { PartRecipe } from './types';
import { wiperMotor } from './wiper-motor';

export const RECIPES: readonly PartRecipe[] = [
  firewallPanel,
  cowl,
  steeringColumn,
  wiperMotor,
  fenderLiner,
  hood,
  engineEnvelope,
  pedalBracket,
  hangingPedal,
  masterCylinder,
  reservoir,
  booster,
  throttlePedal,
  heaterBox,
  exhaustHeader,
  hardLine,
  floorPanel,
  seat,
];

export function recipeOf(kind: string): PartRecipe | null {
  return RECIPES.find((r) => r.kind === kind) ?? null;
}
