/** The part of pngjs that tests read PNG files back with. */
declare module 'pngjs' {
  export interface Picture {
    width: number;
    height: number;
    /** red, green, blue, alpha */
    data: Buffer;
  }
  export const PNG: { sync: { read(bytes: Buffer): Picture } };
}
