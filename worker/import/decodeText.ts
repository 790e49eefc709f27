import { startsAsUtf16 } from './refuseForeignFile.ts';

/**
 * The text of a file: UTF-8 or UTF-16 by its mark, UTF-8 without one, else Windows-1252, of which Latin-1 is a part.
 * Numbers read the same in the last two; only letters of headers and comments can differ. Never throws.
 */
export function decodeText(bytes: Uint8Array): string {
  const utf16 = startsAsUtf16(bytes);
  if (utf16) return new TextDecoder(utf16).decode(bytes);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}
