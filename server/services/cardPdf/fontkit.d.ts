/** What is used of fontkit, which brings no types: the reader of fonts that pdfkit itself uses. */
declare module 'fontkit' {
  export type Font = { hasGlyphForCodePoint(codePoint: number): boolean };
  export function openSync(file: string): Font;
}
