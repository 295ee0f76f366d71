// Numbers that know what they measure. A plain number has to be marked once, at the edge; from then on the compiler keeps
// millimetres and degrees apart.

declare const unit: unique symbol;

export type Millimetres = number & { readonly [unit]: 'mm' };
export type Degrees = number & { readonly [unit]: 'deg' };

export const millimetres = (x: number): Millimetres => x as Millimetres;
export const degrees = (x: number): Degrees => x as Degrees;

export const MM_PER_INCH = 25.4;

/** How a person reads lengths: millimetres, inches with fractions, inches with decimals. */
export type LengthDisplay = 'mm' | 'in' | 'in-decimal';
