// How much of the picture is covered by what lies around it, CSS px; the camera puts its middle into what is left.
import { createContext, useContext } from 'react';

export interface Insets {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export const InsetsContext = createContext<Insets>({ left: 0, right: 0, top: 0, bottom: 0 });

export const useInsets = (): Insets => useContext(InsetsContext);
