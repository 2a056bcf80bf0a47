/** What the tests call of culori, which ships no types. */
declare module 'culori' {
  export interface Rgb {
    mode: 'rgb';
    r: number;
    g: number;
    b: number;
  }
  export interface LinearRgb {
    mode: 'lrgb';
    r: number;
    g: number;
    b: number;
  }
  export interface Lab65 {
    mode: 'lab65';
    l: number;
    a: number;
    b: number;
  }
  export function lab65(colour: Rgb): Lab65;
  export function lrgb(colour: Rgb): LinearRgb;
  export function formatHex(colour: Rgb): string;
}
