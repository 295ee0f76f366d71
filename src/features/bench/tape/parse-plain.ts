/** A plain number with point or comma; null if it is none. A comma before three digits could be a thousand: refused. */
export function parsePlain(text: string): number | null {
  const trimmed = text.trim().replace('\u2212', '-');
  if (!/^[+-]?\d*[.,]?\d+$/.test(trimmed) || /^[+-]?\d{1,3},\d{3}$/.test(trimmed)) return null;
  const value = Number(trimmed.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
}
