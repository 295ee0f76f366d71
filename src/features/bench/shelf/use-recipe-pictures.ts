import { useEffect, useState } from 'react';
import { RECIPES } from '#shared/parts';
import { drawRecipes } from './recipe-pictures';

let drawn: ReadonlyMap<string, string> | null = null;

/** The pictures, drawn when they are first wanted and kept for the visit. */
export function useRecipePictures(): ReadonlyMap<string, string> {
  const [pictures, setPictures] = useState(drawn ?? new Map<string, string>());
  useEffect(() => {
    if (drawn !== null) return undefined;
    // after the shelf has opened, so that opening does not wait
    const timer = setTimeout(() => {
      drawn = drawRecipes(RECIPES);
      setPictures(drawn);
    }, 30);
    return () => clearTimeout(timer);
  }, []);
  return pictures;
}
