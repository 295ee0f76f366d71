import type { LengthDisplay } from '#shared/units';

export const DISPLAYS = ['in', 'in-decimal', 'mm'] as const satisfies readonly LengthDisplay[];

export const DISPLAY_LABEL: Readonly<Record<LengthDisplay, string>> = {
  in: 'inches and fractions',
  'in-decimal': 'inches with decimals',
  mm: 'millimetres',
};
