// What a share link says of itself where it is pasted: Open Graph tags in the page's head.
import { reportSentence, sentenceText } from '#shared/review';
import { ApiError } from '../http/api-error';
import type { Services } from '../http/services';
import { openShare } from './rules';

const escape = (text: string): string =>
  text.replace(/[&<>"']/g, (c) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' })[c]!);

function tag(property: string, content: string): string {
  return `<meta property="${property}" content="${escape(content)}" />`;
}

/** The tags for a share's page; for a link that opens nothing, only that it must not be indexed. */
export async function shareTags(services: Services, token: string, address: string): Promise<string> {
  const hidden = '<meta name="robots" content="noindex" />';
  try {
    await services.limits.use('share', address);
    const { row, revision, scene, report } = await openShare(services.db, token);
    const { baseUrl } = services.config;
    const title = `${revision.project.name}: ${scene.name}, revision ${revision.revision.number}`;
    const text = report === null ? '' : sentenceText(reportSentence(scene, report).parts, revision.project.display);
    const tags = [
      tag('og:type', 'article'),
      tag('og:site_name', 'Gapwright'),
      tag('og:title', title),
      tag('og:description', `${text} Geometry only: trial-fit in metal.`.trim()),
      tag('og:url', `${baseUrl}/s/${token}`),
      `<meta name="description" content="${escape(text)}" />`,
    ];
    if (row.pictureId !== null) {
      tags.push(
        tag('og:image', `${baseUrl}/api/shared/${token}/picture`),
        '<meta name="twitter:card" content="summary_large_image" />',
      );
    }
    return [hidden, ...tags].join('\n    ');
  } catch (error) {
    if (error instanceof ApiError) return hidden;
    throw error;
  }
}
