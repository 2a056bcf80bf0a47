import QRCode from 'qrcode';

export interface QrDrawing {
  /** modules a side, the quiet zone of four included (ISO/IEC 18004) */
  size: number;
  /** SVG path of the dark modules */
  path: string;
}

const QUIET_ZONE = 4;

/** An address as a QR code, drawn as one path so that paper and screen show the same. */
export function qrDrawing(address: string): QrDrawing {
  const { modules } = QRCode.create(address, { errorCorrectionLevel: 'M' });
  const squares: string[] = [];
  for (let row = 0; row < modules.size; row += 1) {
    for (let column = 0; column < modules.size; column += 1) {
      if (modules.get(row, column)) squares.push(`M${column + QUIET_ZONE} ${row + QUIET_ZONE}h1v1h-1z`);
    }
  }
  return { size: modules.size + 2 * QUIET_ZONE, path: squares.join('') };
}
