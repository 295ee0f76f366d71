// A report as it was stored with its revision. The server wrote it; what is looked at here is only whether this page knows its
// version.
import type { Report } from '#shared/check';

export function readReport(stored: unknown): Report | null {
  if (typeof stored !== 'object' || stored === null) return null;
  const { format, version } = stored as { readonly format?: unknown; readonly version?: unknown };
  return format === 'gapwright-report' && version === 1 ? (stored as Report) : null;
}
