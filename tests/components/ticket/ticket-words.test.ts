import { describe, expect, it } from 'vitest';
import { fileWords, frameWords, lineworkLine, passLine } from '../../../src/components/ticket/pass-lines';
import { paperScale, scaleWords, standsInColumn } from '../../../src/components/ticket/paper-scale';
import { qrDrawing } from '../../../src/components/ticket/qr-path';
import { report } from '../order-fixtures';

describe('paperScale', () => {
  it.each([
    [90, 60, 1],
    [182, 112, 1],
    [183, 60, 2],
    [60, 230, 3],
    [600, 400, 4],
  ])('%i × %i mm is drawn 1 : %i', (width, height, scale) => expect(paperScale(width, height)).toBe(scale));
  it('says so in words', () => {
    expect([scaleWords(1), scaleWords(3)]).toEqual(['At true size', 'Drawn 1 : 3']);
    expect([standsInColumn(90, 60), standsInColumn(150, 60), standsInColumn(190, 60)]).toEqual([
      true,
      false,
      true,
    ]);
  });
});

describe('passLine', () => {
  it('says how a pass is run, in the machine’s own unit', () => {
    expect(passLine(report.passes[0], report, 'mm/min')).toBe(
      '545 lines at 0°, 0.110 mm apart; power 42 %, speed 19,200 mm/min; in focus; run-off 17.1 mm at both ends; 0.477 J/mm² (assumes linear power); 4 min 22 s',
    );
  });
  it('leaves out what is not known', () => {
    const bare = { ...report.passes[0], doseJPerMm2: null, scanSeconds: null, runOffMm: null };
    expect(passLine(bare, { ...report, settings: { ...report.settings, recipe: null } }, 'mm/s')).toBe(
      '545 lines at 0°, 0.110 mm apart',
    );
  });
});

describe('frameWords', () => {
  it('says where a turned file lies, and nothing of an upright one', () => {
    expect(frameWords(report.passes[0])).toBeNull();
    const turned = {
      ...report.passes[0],
      scanFrame: { angleDeg: 30, originXMm: 22.5, originYMm: -12.99, outline: [] },
    };
    expect(frameWords(turned)).toBe(
      'The file lies turned by 30°, clockwise positive. Its top left corner is 22.50 mm right and −12.99 mm down from the artwork’s top left corner.',
    );
  });
});

describe('lineworkLine', () => {
  it('is there for linework alone', () => {
    expect(lineworkLine(report, 'mm/s')).toBeNull();
    const trace = {
      method: 'followed' as const,
      nodes: 40,
      paths: 12,
      islandsDropped: 0,
      meanBoundaryMm: null,
      hausdorffMm: null,
      lengthMm: 812.4,
      optimised: true,
    };
    expect(
      lineworkLine({ ...report, trace, settings: { ...report.settings, treatment: 'linework' } }, 'mm/s'),
    ).toBe('Follow 12 paths, 812 mm in all; power 42 %, speed 320 mm/s; in focus');
  });
});

describe('qrDrawing', () => {
  it('keeps the quiet zone of four modules and the finder patterns in three corners', () => {
    const { size, path } = qrDrawing('https://shop.example/tickets/U-1004');
    expect((size - 8 - 17) % 4).toBe(0);
    expect(path).toContain('M4 4h1v1h-1z');
    expect(path).toContain(`M${size - 5} 4h`);
    expect(path).not.toMatch(/M[0-3] /);
  });
});

describe('fileWords', () => {
  it('names the same file in several formats once', () => {
    expect(fileWords(['a-0.110mm.png', 'a-0.110mm.tiff', 'a-0.110mm.bmp'])).toBe(
      'a-0.110mm, as .png, .tiff or .bmp',
    );
    expect(fileWords(['a.svg'])).toBe('a, as .svg');
    expect(fileWords([])).toBe('');
  });
});
