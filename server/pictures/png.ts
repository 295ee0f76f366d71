// Is it a PNG, and how large? Looked up in its own header (PNG specification, IHDR), nothing is decoded.

const SIGNATURE = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a];
const END = [0, 0, 0, 0, 0x49, 0x45, 0x4e, 0x44, 0xae, 0x42, 0x60, 0x82];
const LARGEST_SIDE = 8192;

/** Width and height in pixels, or null if the bytes are no PNG of a sensible size. */
export function pngSize(bytes: Uint8Array): { width: number; height: number } | null {
  if (bytes.length < 45 || SIGNATURE.some((x, i) => bytes[i] !== x)) return null;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.length);
  // whole, and nothing hidden behind it
  if (END.some((x, i) => bytes[bytes.length - END.length + i] !== x)) return null;
  if (view.getUint32(8) !== 13 || view.getUint32(12) !== 0x49484452) return null;
  const width = view.getUint32(16);
  const height = view.getUint32(20);
  const isSensible = width > 0 && height > 0 && width <= LARGEST_SIDE && height <= LARGEST_SIDE;
  return isSensible ? { width, height } : null;
}
