import PDFDocument from 'pdfkit';
import { mmToPoints } from '../../units';
import type { Linework } from '../trace/linework';
import { mirrored } from './mirrored';

/** Files of the same lines must be the same bytes: no clock in them. */
const FIXED_DATE = new Date(0);

/**
 * Lines as a PDF page at true size: one black, one width.
 * @param linework unchanged
 * @param options.mirror left and right exchanged
 * @returns the same bytes for the same lines; dates are fixed at 1970-01-01
 */
export async function lineworkPdf(linework: Linework, { mirror }: { mirror: boolean }): Promise<Uint8Array> {
  const { widthMm, heightMm, strokeWidthMm, paths } = mirror ? mirrored(linework) : linework;
  const size: [number, number] = [mmToPoints(widthMm), mmToPoints(heightMm)];
  const document = new PDFDocument({
    size,
    margin: 0,
    compress: true,
    info: { CreationDate: FIXED_DATE, ModDate: FIXED_DATE, Producer: 'Umberline', Creator: 'Umberline' },
  });
  const chunks: Uint8Array[] = [];
  const ended = new Promise<void>((resolve, reject) => {
    document.on('data', (chunk: Uint8Array) => chunks.push(chunk));
    document.on('end', resolve);
    document.on('error', reject);
  });
  document.scale(mmToPoints(1));
  document.lineWidth(strokeWidthMm).lineCap('round').lineJoin('round').strokeColor('black');
  for (const path of paths) document.path(path);
  if (paths.length > 0) document.stroke();
  document.end();
  await ended;
  const bytes = new Uint8Array(chunks.reduce((sum, chunk) => sum + chunk.length, 0));
  chunks.reduce((at, chunk) => {
    bytes.set(chunk, at);
    return at + chunk.length;
  }, 0);
  return bytes;
}
