import type { ManifestFile } from '../manifest';
import type { Linework } from '../trace/linework';
import type { PrepareWork } from '../work';
import { fileName } from './file-name';
import { lineworkPdf } from './linework-pdf';
import { lineworkSvg } from './linework-svg';
import { frameEntry } from './package-rasters';

export interface PackagedLinework {
  files: PrepareWork['files'];
  /** whether the SVG could be written shorter without looking different */
  optimised: boolean;
}

/**
 * The files of followed lines: SVG in mm and PDF at true size.
 * @param work with its first pass marked; unchanged
 * @param linework the lines; unchanged
 * @returns two files with what the manifest says of each
 */
export async function packageLinework(work: PrepareWork, linework: Linework): Promise<PackagedLinework> {
  const { settings, preparationKey, tools } = work;
  const { frame } = work.passes[0];
  const { mirror, label, widthMm, heightMm } = settings;
  const svg = await lineworkSvg(linework, { mirror }, tools);
  const pdf = await lineworkPdf(linework, { mirror });
  const place = frameEntry(1, frame);
  const file = (bytes: Uint8Array, extension: string, mediaType: string): PrepareWork['files'][number] => {
    const name = fileName({ label, ...place, preparationKey, extension });
    const sha256 = tools.sha256(bytes);
    const size = { widthPx: null, heightPx: null, widthMm, heightMm };
    const entry: ManifestFile = {
      name,
      role: 'linework',
      mediaType,
      bytes: bytes.length,
      sha256,
      ...place,
      ...size,
    };
    return { name, mediaType, bytes, entry };
  };
  return {
    files: [file(svg.bytes, 'svg', 'image/svg+xml'), file(pdf, 'pdf', 'application/pdf')],
    optimised: svg.optimised,
  };
}
