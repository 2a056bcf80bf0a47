import type { Place } from './finding';

/** A place with a width that is held against a limit of its own. */
export interface WidthPlace extends Place {
  minMm: number;
  limitMm: number;
}

export interface WidthFacts {
  /** number of places, also those beyond the listed ones */
  count: number;
  /** smallest width first, at most 200 */
  places: WidthPlace[];
  /** lowest width ÷ line extent of all places, ratio; null where there is none */
  worstRatio: number | null;
}

export interface AreaFacts {
  count: number;
  /** smallest first, at most 200; `minMm` is the diameter of the disc of the same area */
  places: Place[];
  /** diameter of the disc that has the spot's area, mm */
  limitMm: number;
}

export interface SourceFacts {
  /** pixels of the artwork for each mm of the placed size; null where it can be drawn at any */
  pxPerMm: number | null;
  /** strokes and gaps of under 1.5 pixels of the artwork, whose width the pixels do not tell */
  unresolved: { count: number; places: Place[] };
}

export interface ToneFacts {
  /** share of the area that is tonal, 0–1 */
  tonalShare: number;
  /** share of the area that is one flat tint between dark and light, 0–1 */
  tintShare: number;
  /** share of the area that is burned at the dividing level, 0–1 */
  burnedShare: number;
  /** mean coverage, 0–1 */
  meanCoverage: number;
  /** L* that 2 % of the area lies under, and that 98 % lies under */
  darkLstar: number;
  lightLstar: number;
  /** the most common light L* along the border, and its share of the border, 0–1 */
  borderLstar: number;
  borderShare: number;
  /** share of the burned area that lies in strokes under three line extents, 0–1 */
  thinShare: number;
}

export interface PlacementFacts {
  widthMm: number;
  heightMm: number;
  /** how far the artwork reaches beyond the blank on each side, mm; 0 inside; null without a blank */
  beyondBlank: { leftMm: number; rightMm: number; topMm: number; bottomMm: number } | null;
  /** how far burned areas reach beyond a round blank, mm; 0 inside; null for other outlines */
  beyondRoundMm: number | null;
  /** travel beyond each end of a line to reach speed, mm; 0 where speed is not known */
  runOffMm: number;
  /** what is missing of the machine's bed along X and Y, run-off counted; 0 where it fits; null without a machine */
  beyondBed: { xMm: number; yMm: number } | null;
}

/** What was measured of an artwork at its placed size: numbers and names, no judgement. Millimetres from its top left corner. */
export interface Facts {
  placement: PlacementFacts;
  /** distance between scan lines, mm */
  linePitchMm: number;
  hairlines: WidthFacts;
  fillIns: WidthFacts;
  specks: AreaFacts;
  pinholes: AreaFacts;
  /** tips of 20° to 40° whose end is thinner than the line extent */
  sharpTips: { count: number; places: Place[] };
  source: SourceFacts;
  tone: ToneFacts;
  /** pixels per mm that widths were measured at; null where nothing was measured */
  measuredPxPerMm: number | null;
  /** font families asked for and not to be had */
  missingFonts: string[];
  /** what was taken out of the file for safety, in words */
  removed: string[];
  /** whether the file holds further pictures beyond the first */
  severalFrames: boolean;
}
