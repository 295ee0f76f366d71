// The present look as a picture, with the standpoint's name as people read it.
import { inWords, type WordChoice } from '../../../lib/part-words';
import { isSquareOn, STANDPOINT_NAME } from '../standpoints/standpoints';
import type { Picture } from '../viewport/capture';
import type { ViewControl } from '../viewport/view-control';

export interface NamedPicture extends Pick<Picture, 'blob' | 'width' | 'height'> {
  readonly standpoint: string | null;
}

export async function captureNamed(view: ViewControl, words: WordChoice): Promise<NamedPicture> {
  const hand = view.hand();
  if (hand === null)
    throw new Error('The scene is not drawn in this browser, so there is nothing to take a picture of.');
  const { standpoint, ...picture } = await hand.captureView();
  if (standpoint === null) return { ...picture, standpoint: null };
  const name = inWords(STANDPOINT_NAME[standpoint], words);
  return { ...picture, standpoint: isSquareOn(standpoint) ? `${name}, square-on` : name };
}
