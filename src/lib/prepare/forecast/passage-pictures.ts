import type { StockTone } from '../settings';
import { FULL_LUMINANCE } from '../../imaging/srgb';
import type { PassagePicture } from '../report';
import { placedGrey } from '../resample/resample';
import type { Grey } from '../resample/upright';
import { burnTable } from '../tone/burn-table';
import type { PrepareWork } from '../work';
import { colourPicture } from './colour-picture';
import { followedShare } from './followed-share';
import { burnedShare, markedShare, type PictureSize } from './marked-share';
import { pictureSize } from './picture-size';
import { luminancePicture, mixturePicture, sharePicture } from './shade-picture';

/** Colours where no stock is named: white paper and black, which promise nothing. */
const UNNAMED: Pick<StockTone, 'groundColour' | 'markColour'> = {
  groundColour: '#ffffff',
  markColour: '#000000',
};

function mirrored(grey: Grey, mirror: boolean): Grey {
  if (!mirror) return grey;
  const data = grey.data.slice();
  for (let start = 0; start < data.length; start += grey.width)
    data.subarray(start, start + grey.width).reverse();
  return { ...grey, data };
}

/** Shares of two passes laid over each other: what neither marks stays ground. */
function overlaid(first: Grey, second: Grey | undefined): Grey {
  if (!second) return first;
  const data = first.data.map((a, i) => a + (second.data[i] * (FULL_LUMINANCE - a)) / FULL_LUMINANCE);
  return { ...first, data };
}

function toned(sized: Grey, table: Float32Array): Grey {
  return { ...sized, data: sized.data.map((sample) => table[sample] * FULL_LUMINANCE + 0.5) };
}

/** What is asked to burn, and what the spots will mark. */
async function sharesOf(work: PrepareWork, size: PictureSize): Promise<{ asked: Grey; marked: Grey }> {
  const { passes, settings, linework, tools } = work;
  const { spot, firing, mirror } = settings;
  const asked = burnedShare(passes[0].marks, passes[0].frame, size);
  if (linework) return { asked, marked: mirrored(await followedShare(linework, spot, size, tools), mirror) };
  const marked = passes.map(({ marks, frame }) => markedShare(marks, frame, spot, firing, size));
  return { asked, marked: overlaid(marked[0], marked[1]) };
}

/**
 * The five pictures of the passage: the artwork as it was sent, at its placed size, turned into burn, screened, and burned.
 * All show the whole placed artwork on the same pixels, so that they can be laid over each other; a mirrored file is shown
 * mirrored from its size on.
 * @param work with its passes marked; unchanged
 * @returns PNGs by name
 */
export async function passagePictures(work: PrepareWork): Promise<Record<PassagePicture, Uint8Array>> {
  const { settings, artwork, bytes, tools, passes, turned } = work;
  const { widthMm, heightMm, quarterTurns, mirror } = settings;
  const pitch = Math.min(...passes.flatMap(({ frame }) => [frame.pitchXMm, frame.pitchYMm]));
  const size = pictureSize(widthMm, heightMm, pitch);
  const tonal = settings.treatment === 'halftone' || settings.treatment === 'continuous';
  const placed = await placedGrey(turned, size.columns, size.rows, tonal ? 'linear' : 'coverage', tools);
  const sized = mirrored(placed, mirror);
  const { asked, marked } = await sharesOf(work, size);
  const { groundColour, markColour } = settings.stock ?? UNNAMED;
  const pictures = await Promise.all([
    colourPicture(bytes, artwork, quarterTurns, size.columns, size.rows, tools),
    luminancePicture(sized),
    sharePicture(toned(sized, burnTable(settings))),
    sharePicture(asked),
    mixturePicture(marked, groundColour, markColour),
  ]);
  const [sent, sizedPicture, tonedPicture, screened, burned] = pictures;
  return { sent, sized: sizedPicture, toned: tonedPicture, screened, burned };
}
