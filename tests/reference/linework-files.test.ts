import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect } from 'vitest';
import { lineworkPdf } from '../../src/lib/prepare/package/linework-pdf';
import type { Linework } from '../../src/lib/prepare/trace/linework';
import { needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';

const LINEWORK: Linework = {
  widthMm: 123.4,
  heightMm: 56.7,
  strokeWidthMm: 0.09,
  paths: ['M10 10L50 10', 'M60 10C70 20 80 0 90 10'],
  report: {
    method: 'followed',
    nodes: 4,
    paths: 2,
    islandsDropped: 0,
    meanBoundaryMm: null,
    hausdorffMm: null,
    lengthMm: 70,
  },
};

referenceCheck(
  {
    what: 'PDF of followed lines: sound file, page of the placed size, fixed dates',
    basis: 'computed',
    source: 'Debian qpdf 11.3.0 and pdfinfo (poppler 22.12), called in the test',
    within: '0.001 mm',
  },
  async () => {
    needsTool('qpdf', 'pdfinfo');
    const folder = mkdtempSync(join(tmpdir(), 'umberline-pdf-'));
    try {
      const file = join(folder, 'lines.pdf');
      writeFileSync(file, await lineworkPdf(LINEWORK, { mirror: false }));
      expect(execFileSync('qpdf', ['--check', file], { encoding: 'utf8' })).toContain(
        'No syntax or stream encoding errors',
      );
      const said = execFileSync('pdfinfo', [file], { encoding: 'utf8', env: { ...process.env, TZ: 'UTC' } });
      const [, width, height] = /Page size:\s+([\d.]+) x ([\d.]+) pts/.exec(said)!;
      expect((Number(width) / 72) * 25.4).toBeCloseTo(123.4, 3);
      expect((Number(height) / 72) * 25.4).toBeCloseTo(56.7, 3);
      expect(said).toMatch(/CreationDate:\s+Thu Jan\s+1 00:00:00 1970/);
      expect(said).toMatch(/Pages:\s+1\b/);
    } finally {
      rmSync(folder, { recursive: true });
    }
  },
);
