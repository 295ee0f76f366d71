/** The least side of a solid that can be typed, mm: a sixty-fourth of an inch, the finest that is read here. */
export const LEAST_SIZE = 0.4;
