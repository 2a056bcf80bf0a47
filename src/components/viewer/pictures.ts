import { PASSAGE, type PassagePicture } from '@/lib/prepare/report';
import type { PreparationView } from '@/lib/orders/views';

export const PICTURE_WORDS: Record<PassagePicture, { name: string; words: string }> = {
  sent: { name: 'Sent', words: 'as the customer sent it' },
  sized: { name: 'Sized', words: 'at the placed size, one row per scan line' },
  toned: { name: 'Toned', words: 'as burn, dark where the laser marks' },
  screened: { name: 'Screened', words: 'as the machine gets it' },
  burned: { name: 'Burned', words: 'as it will look on the stock' },
};

/** Where the prepared raster's own frame lies in the artwork's frame. */
export interface DetailFrame {
  url: string;
  widthPx: number;
  heightPx: number;
  /** distance between neighbouring columns and rows of the file */
  xPitchMm: number;
  yPitchMm: number;
  angleDeg: number;
  originXMm: number;
  originYMm: number;
}

export interface ViewerPicture {
  name: PassagePicture;
  url: string;
  /** the prepared raster itself, shown where the frame holds more than the picture does */
  detail: DetailFrame | null;
}

function detailOf(preparation: PreparationView): DetailFrame | null {
  const { report } = preparation;
  const raster = report?.files.find(
    (f) => f.role === 'raster' && f.mediaType === 'image/png' && f.pass === 1,
  );
  const file = preparation.files.find((f) => f.name === raster?.name);
  const pass = report?.passes.find((p) => p.pass === 1);
  if (!report || !raster || !file || !pass || raster.widthPx === null || raster.heightPx === null)
    return null;
  return {
    url: file.url,
    widthPx: raster.widthPx,
    heightPx: raster.heightPx,
    xPitchMm: raster.widthMm / raster.widthPx,
    yPitchMm: raster.heightMm / raster.heightPx,
    angleDeg: pass.scanFrame?.angleDeg ?? 0,
    originXMm: pass.scanFrame?.originXMm ?? 0,
    originYMm: pass.scanFrame?.originYMm ?? 0,
  };
}

/** The pictures of a preparation in the order of the passage; those that do not exist yet are left out. */
export function picturesOf(preparation: PreparationView | null, sentUrl: string | null): ViewerPicture[] {
  return PASSAGE.flatMap((name) => {
    const url = preparation?.pictures[name] ?? (name === 'sent' ? sentUrl : null);
    if (!url) return [];
    const detail = name === 'screened' && preparation ? detailOf(preparation) : null;
    return [{ name, url, detail }];
  });
}

/** The two pictures compared after one is chosen: a third takes the place of the one chosen first. */
export function chooseTwo(
  chosen: readonly PassagePicture[],
  next: PassagePicture,
  existing: readonly PassagePicture[],
): PassagePicture[] {
  if (chosen.includes(next)) return chosen.length > 1 ? chosen.filter((name) => name !== next) : [...chosen];
  return [...chosen.filter((name) => existing.includes(name)), next].slice(-2);
}
