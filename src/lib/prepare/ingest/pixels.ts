import type { ReadableType } from './file-type';

/** sRGB code values of a decoded picture, orientation applied, not premultiplied, row-major. */
export interface Pixels {
  width: number;
  height: number;
  /** 3 red, green, blue; 4 with alpha */
  channels: 3 | 4;
  /** 8 bit: 0–255; 16 bit: 0–65535 */
  data: Uint8Array | Uint16Array;
}

/** What a picture's header says, before anything is decoded. */
export interface PictureHeader {
  type: Exclude<ReadableType, 'svg' | 'svgz'>;
  /** pixels as they are stored, before orientation */
  widthPx: number;
  heightPx: number;
  /** whether orientation swaps width and height */
  swapsSides: boolean;
  /** pictures in the file: frames, pages */
  frames: number;
  depth: 8 | 16;
  exif: Uint8Array | undefined;
  /** what is done to it on the way in, in words */
  remarks: string[];
}
