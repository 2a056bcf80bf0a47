import type { ArtworkFacts } from './report';

/** What ingest learned before anything is placed; the suggestion of a treatment is added by measure. */
export type IngestFacts = Omit<ArtworkFacts, 'suggestedTreatment' | 'suggestionReason' | 'tonalShare'>;

/** A picture made of pixels, orientation applied, laid over the ground: transparent = not engraved. */
export interface RasterArtwork {
  kind: 'raster';
  facts: IngestFacts;
  widthPx: number;
  heightPx: number;
  /** relative luminance in linear light, 0–65535, row-major, widthPx × heightPx */
  luminance: Uint16Array;
}

/** A drawing that was found safe to render. */
export interface VectorArtwork {
  kind: 'vector';
  facts: IngestFacts;
  /** sanitised SVG, UTF-8, with its own width, height and viewBox resolved to numbers */
  svg: Uint8Array;
  /** width ÷ height of the drawing */
  aspect: number;
  /** font families asked for and not shipped, in document order */
  missingFonts: string[];
  /** what was taken out for safety, in words */
  removed: string[];
}

export type Artwork = RasterArtwork | VectorArtwork;
