import type { ManifestFile } from '../manifest';
import type { ScanFrame } from '../resample/scan-frame';
import type { PrepareWork } from '../work';
import { fileName } from './file-name';
import { RASTER_MEDIA_TYPE, writeRaster } from './write-raster';

/** What the manifest says of a file, besides its name, bytes and hash. */
export function frameEntry(pass: 1 | 2, { linesAre, pitchXMm, pitchYMm, directionDeg }: ScanFrame) {
  const [linePitchMm, alongPitchMm] = linesAre === 'rows' ? [pitchYMm, pitchXMm] : [pitchXMm, pitchYMm];
  return { pass, directionDeg, linePitchMm, alongPitchMm };
}

/**
 * The raster files of all passes, in every format asked for.
 * @param work with its passes marked; unchanged
 * @returns files with what the manifest says of each
 */
export async function packageRasters(work: PrepareWork): Promise<PrepareWork['files']> {
  const { settings, preparationKey, passes, tools } = work;
  const files: PrepareWork['files'] = [];
  for (const { pass, frame, marks } of passes) {
    for (const format of settings.formats) {
      const bytes = await writeRaster(marks, format);
      const mediaType = RASTER_MEDIA_TYPE[format];
      const place = frameEntry(pass, frame);
      const name = fileName({ label: settings.label, ...place, preparationKey, extension: format });
      const entry: ManifestFile = {
        name,
        role: 'raster',
        mediaType,
        bytes: bytes.length,
        sha256: tools.sha256(bytes),
        ...place,
        widthPx: frame.columns,
        heightPx: frame.rows,
        widthMm: frame.widthMm,
        heightMm: frame.heightMm,
      };
      files.push({ name, mediaType, bytes, entry });
    }
  }
  return files;
}
