import 'server-only';
import sharp from 'sharp';

export interface PreparedImage {
  /** WebP, at most 1600 px on the longer side. */
  large: Uint8Array<ArrayBuffer>;
  /** WebP, at most 320 px on the longer side. */
  small: Uint8Array<ArrayBuffer>;
  width: number;
  height: number;
}

const LARGE = 1600;
const SMALL = 320;
/** A picture that unfolds to more than this is refused before it is decoded. */
const MOST_PIXELS = 80_000_000;
const taken = new Set(['jpeg', 'png', 'webp', 'heif', 'gif', 'tiff']);

/**
 * Reads a picture by its content, turns it upright, and makes two smaller ones without any metadata: where and with
 * what it was taken is nobody's business.
 * @returns null when the content is no picture that can be read
 */
export async function prepareImage(content: Uint8Array): Promise<PreparedImage | null> {
  try {
    const source = sharp(content, { limitInputPixels: MOST_PIXELS, failOn: 'error' });
    const { format } = await source.metadata();
    if (!format || !taken.has(format)) return null;
    // Without `withMetadata` sharp writes neither EXIF nor XMP nor a profile; colours are turned into sRGB.
    const upright = source.rotate();
    const large = await upright
      .clone()
      .resize({ width: LARGE, height: LARGE, fit: 'inside', withoutEnlargement: true })
      .webp({ quality: 82 })
      .toBuffer({ resolveWithObject: true });
    const small = await upright
      .clone()
      .resize({ width: SMALL, height: SMALL, fit: 'inside', withoutEnlargement: true })
      .webp({ quality: 76 })
      .toBuffer();
    return {
      large: new Uint8Array(large.data),
      small: new Uint8Array(small),
      width: large.info.width,
      height: large.info.height,
    };
  } catch {
    return null;
  }
}

type DocumentType = 'application/pdf' | 'image/jpeg' | 'image/png' | 'text/plain';

const magic: { type: DocumentType; bytes: number[] }[] = [
  { type: 'application/pdf', bytes: [0x25, 0x50, 0x44, 0x46, 0x2d] },
  { type: 'image/jpeg', bytes: [0xff, 0xd8, 0xff] },
  { type: 'image/png', bytes: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
];

/** What a file is by its first bytes; plain text by being valid UTF-8 without control characters. Null for all else. */
export function sniffDocument(content: Uint8Array): DocumentType | null {
  const known = magic.find(({ bytes }) => bytes.every((byte, index) => content[index] === byte));
  if (known) return known.type;
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(content);
    // Markup would be run by a browser that is told to guess; it is no plain note either.
    if (/^\s*<(!doctype|html|svg|script|\?xml)/i.test(text)) return null;
    return /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/.test(text) ? null : 'text/plain';
  } catch {
    return null;
  }
}
