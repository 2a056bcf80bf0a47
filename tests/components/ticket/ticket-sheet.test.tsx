// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { qrDrawing } from '../../../src/components/ticket/qr-path';
import { TicketSheet } from '../../../src/components/ticket/TicketSheet';
import type { Report } from '../../../src/lib/prepare/report';
import { orderView, preparation, report } from '../order-fixtures';

afterEach(cleanup);

function open(changed: Partial<Report> = {}) {
  render(
    <TicketSheet
      order={orderView({ state: 'released' })}
      preparation={preparation}
      report={{ ...report, ...changed }}
      sentence="Screen as halftone."
      placementWords="The artwork’s centre lies on the blank’s centre."
      qr={qrDrawing('https://shop.example/tickets/U-1004')}
      speedUnit="mm/s"
    />,
  );
  return screen.getByRole('article', { name: 'Job ticket U-1004' }).textContent ?? '';
}

describe('TicketSheet', () => {
  it('says all that an operator needs to run the order without asking', () => {
    const text = open();
    for (const words of [
      'U-1004',
      'Due 4 Dec 2026',
      '3 pieces',
      'Screen as halftone.',
      'At true size',
      '545 lines at 0°',
      'U-1004-pass1-0.110mm-0deg-1a2b3c4d, as .png',
      'Run one image row per scan line; do not rescale.',
      'typed by Ines Okafor, not measured',
      'About 4 min 22 s a piece, 13 min for 3, without loading.',
      'The artwork’s centre lies on the blank’s centre.',
      'fill in: The gaps are decoration and may close.',
      'Glued board.',
      'I stay with the machine while it runs.',
    ]) {
      expect(text).toContain(words);
    }
    expect(screen.getByRole('img', { name: 'A bar of 50 mm' }).getAttribute('width')).toBe('50mm');
  });
  it('draws the plate at true size in millimetres, and smaller by a whole number where it does not fit', () => {
    open();
    expect(screen.getByRole('img', { name: /at true size/ }).style.width).toBe('90mm');
    cleanup();
    const text = open({ widthMm: 500, heightMm: 300 });
    expect(text).toContain('Drawn 1 : 3');
    expect(screen.getByRole('img', { name: /drawn 1 : 3/ }).style.width).toMatch(/^166\.6\d+mm$/);
  });
  it('says that paths are followed where there is linework', () => {
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
    const files = [
      { ...report.files[0], role: 'linework' as const, name: 'U-1004.svg', widthPx: null, heightPx: null },
    ];
    const text = open({ trace, files, settings: { ...report.settings, treatment: 'linework' } });
    expect(text).toContain('Follow 12 paths, 812 mm in all');
    expect(text).toContain('Run the paths at their own size; do not rescale.');
    expect(text).toContain('U-1004, as .svg');
  });
});
