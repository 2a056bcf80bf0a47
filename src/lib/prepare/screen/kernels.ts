/** Where an error diffusion hands a pixel's error to, before it and below it. */
export interface Kernel {
  divisor: number;
  /** columns ahead (dx, in the direction of travel), rows below (dy), weight ÷ divisor */
  taps: readonly { dx: number; dy: number; weight: number }[];
}

/** A kernel from its rows of weights; the first row begins behind the pixel itself, the others are centred on it. */
function kernel(divisor: number, ahead: readonly number[], ...below: readonly (readonly number[])[]): Kernel {
  return {
    divisor,
    taps: [
      ...ahead.map((weight, i) => ({ dx: i + 1, dy: 0, weight })),
      ...below.flatMap((row, dy) =>
        row.map((weight, i) => ({ dx: i - (row.length - 1) / 2, dy: dy + 1, weight })),
      ),
    ],
  };
}

/** Floyd & Steinberg, An adaptive algorithm for spatial greyscale, Proc. SID 17(2), 1976, 75–77. */
export const FLOYD_STEINBERG = kernel(16, [7], [3, 5, 1]);

/** Jarvis, Judice & Ninke, A survey of techniques for the display of continuous tone pictures on bilevel displays, CGIP 5(1), 1976, 13–40. */
export const JARVIS_JUDICE_NINKE = kernel(48, [7, 5], [3, 5, 7, 5, 3], [1, 3, 5, 3, 1]);

/** Stucki, MECCA: a multiple-error correcting computation algorithm for bilevel image hardcopy reproduction, IBM RZ1060, 1981. */
export const STUCKI = kernel(42, [8, 4], [2, 4, 8, 4, 2], [1, 2, 4, 2, 1]);
