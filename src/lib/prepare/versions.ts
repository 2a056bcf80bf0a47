// What this program is built with is a constant of it, not its surroundings.
// eslint-disable-next-line no-restricted-imports
import { versions as programs } from 'node:process';
import { dependencies } from '../../../package.json';
import { sharp } from './sharp';

/** Raised whenever the same request would give other bytes. */
const PIPELINE_VERSION = '1';

/** Packages whose code decides bytes of a prepared file. */
const PACKAGES = [
  'clipper2-ts',
  'css-tree',
  'jimp',
  'pdfkit',
  'potrace',
  'saxes',
  'sharp',
  'svgo',
  'svgpath',
] as const;
/** Libraries inside sharp that do so. */
const PICTURE_LIBRARIES = [
  'vips',
  'rsvg',
  'cairo',
  'tiff',
  'png',
  'mozjpeg',
  'webp',
  'heif',
  'aom',
  'lcms',
] as const;

/**
 * Name → version of the pipeline and of every library whose code decides bytes, for the manifest.
 * @returns the same values in every process of one installation
 * @example versions().pipeline // '1'
 */
export function versions(): Record<string, string> {
  const inSharp: Readonly<Record<string, string | undefined>> = sharp.versions;
  return {
    pipeline: PIPELINE_VERSION,
    ...Object.fromEntries(PACKAGES.map((name) => [name, dependencies[name]])),
    ...Object.fromEntries(PICTURE_LIBRARIES.map((name) => [`sharp/${name}`, inSharp[name] ?? 'none'])),
    v8: programs.v8,
    zlib: programs.zlib,
  };
}
