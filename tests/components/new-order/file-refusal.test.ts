import { describe, expect, test } from 'vitest';
import { refusalBeforeUpload } from '@/components/new-order/file-refusal';

const MIB = 1024 * 1024;

describe('refusalBeforeUpload', () => {
  test.each(['mark.svg', 'photo.JPG', 'scan.tiff', 'no-ending', 'archive.tar.png'])('%s is sent', (name) => {
    expect(refusalBeforeUpload({ name, size: 1000 })).toBeNull();
  });

  test.each([
    ['plan.pdf', 'PDF', 'SVG'],
    ['MARK.AI', 'AI', 'SVG'],
    ['mark.eps', 'EPS', 'SVG'],
    ['IMG_1.heic', 'HEIC', 'JPEG'],
  ])('%s is refused with what to export', (name, type, exportAs) => {
    const refusal = refusalBeforeUpload({ name, size: 1000 });
    expect(refusal?.title).toBe(
      `A${type === 'AI' || type === 'EPS' ? 'n' : ''} ${type} file cannot be engraved as it is.`,
    );
    expect(refusal?.action).toContain(exportAs);
    expect(refusal?.action).toContain('drop that here');
  });

  test('an empty file says so first, whatever its name', () => {
    expect(refusalBeforeUpload({ name: 'plan.pdf', size: 0 })?.title).toBe('This file is empty.');
  });

  test('64 MiB are taken, one byte more is not', () => {
    expect(refusalBeforeUpload({ name: 'a.png', size: 64 * MIB })).toBeNull();
    const refusal = refusalBeforeUpload({ name: 'a.png', size: 64 * MIB + 1 });
    expect(refusal?.title).toBe('This file is too large.');
    expect(refusal?.detail).toContain('64 MiB');
  });
});
