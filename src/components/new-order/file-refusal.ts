import type { Problem } from '@/lib/orders/views';
import { LIMITS } from '@/lib/prepare/tools';

const MIB = 1024 * 1024;

/** Files that are taken, as the file chooser is told. The bytes decide on the server, never the name. */
export const TAKEN = '.svg,.png,.jpg,.jpeg,.webp,.tif,.tiff,.gif,.avif,.bmp';

/** What can be told to export, by the ending of its name. */
const EXPORT_AS: Record<string, string> = {
  pdf: 'Open it in your drawing program and export it as SVG, or as PNG at 600 pixels per inch, and drop that here.',
  ai: 'Export it from your drawing program as SVG with text turned into outlines, and drop that here.',
  eps: 'Export it from your drawing program as SVG with text turned into outlines, and drop that here.',
  heic: 'Export it from your photo program as JPEG or PNG, and drop that here.',
  heif: 'Export it from your photo program as JPEG or PNG, and drop that here.',
  psd: 'Export it from your picture program as PNG or TIFF, and drop that here.',
  cdr: 'Export it from your drawing program as SVG with text turned into outlines, and drop that here.',
  dxf: 'Export it from your drawing program as SVG, and drop that here.',
  docx: 'Export the drawing in it as PNG, and drop that here.',
};

/** What can be refused before anything is sent; null where the server decides. */
export function refusalBeforeUpload(file: Pick<File, 'name' | 'size'>): Problem | null {
  const ending = /\.([a-z0-9]+)$/i.exec(file.name)?.[1]?.toLowerCase() ?? '';
  if (file.size === 0) {
    return refusal(
      'empty-file',
      'This file is empty.',
      'Nothing was saved in it.',
      'Export it again and drop it here.',
    );
  }
  if (ending in EXPORT_AS) {
    return refusal(
      'unsupported-format',
      `${/^[ae]/.test(ending) ? 'An' : 'A'} ${ending.toUpperCase()} file cannot be engraved as it is.`,
      'We take drawings as SVG and pictures as PNG, TIFF, JPEG, WebP, AVIF, GIF or BMP.',
      EXPORT_AS[ending],
    );
  }
  if (file.size > LIMITS.maxBytes) {
    const size = `${(file.size / MIB).toFixed(0)} MiB`;
    return refusal(
      'too-large',
      'This file is too large.',
      `It has ${size}; up to ${LIMITS.maxBytes / MIB} MiB are taken.`,
      'Export it at the size at which it will be engraved and drop it here.',
    );
  }
  return null;
}

function refusal(code: string, title: string, detail: string, action: string): Problem {
  return { code, title, detail, action };
}
