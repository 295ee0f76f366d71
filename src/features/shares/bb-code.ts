// What goes into a build thread: the picture that leads to the link, what was found, and the caution that belongs to it.
import { CAUTION_SHORT } from '#shared/review';

export interface BbCodeFacts {
  readonly projectName: string;
  readonly sceneName: string;
  readonly number: number;
  /** The opening sentence in plain text. */
  readonly sentence: string;
  readonly url: string;
  readonly pictureUrl: string | null;
}

/** Square brackets would be read as code, and BBCode has no way to escape them. */
const harmless = (text: string): string => text.replaceAll('[', '(').replaceAll(']', ')').replace(/\s+/g, ' ').trim();

export function bbCode({ projectName, sceneName, number, sentence, url, pictureUrl }: BbCodeFacts): string {
  return [
    ...(pictureUrl === null ? [] : [`[url=${url}][img]${pictureUrl}[/img][/url]`]),
    `[b]${harmless(projectName)}: ${harmless(sceneName)}, revision ${number}[/b]`,
    ...(sentence === '' ? [] : [harmless(sentence)]),
    `[url=${url}]Turn it in 3D[/url]`,
    `[i]${CAUTION_SHORT}[/i]`,
  ].join('\n');
}
