/** The two calls that the tests make; the package ships no types. */
declare module 'opentype.js' {
  interface Font {
    /** 0 where the font has no glyph for the sign */
    charToGlyphIndex(sign: string): number;
  }
  export function parse(bytes: ArrayBuffer): Font;
}
