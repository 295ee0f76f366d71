// Pedals, brakes and steering can kill. These words stand wherever a result is read, printed, exported, mailed, shared or
// signed.

export const CAUTIONS = [
  'The check is geometric and only as good as the measurements.',
  'Structure, hydraulics, materials and heat are not proven by it.',
  "Follow the parts makers' instructions and local vehicle rules.",
  'Have structure, brakes and steering approved by a licensed engineer or certifier where local rules ask for it.',
  'Trial-fit in metal and move every pedal through its full stroke by hand before driving.',
] as const;

/** For captions, where there is room for a line. */
export const CAUTION_SHORT =
  'Geometry only, as good as its measurements; structure, brakes and heat are not proven. Trial-fit and move every pedal by hand before driving.';

/** Before anything is measured, cut or welded. */
export const CAUTION_BEFORE_WORK =
  'Before measuring, cutting or welding: car on stands, battery off, fuel safe, airbags made safe; never look into the laser.';
