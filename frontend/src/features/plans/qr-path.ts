import QRCode from 'qrcode';

export interface QrPath {
  /** Modules along a side, the quiet zone of four on each side included (ISO/IEC 18004). */
  readonly size: number;
  /** One path of all dark modules, a module being one unit. */
  readonly path: string;
}

const quiet = 4;

/** The QR code of a text, with a quarter of it allowed to get dirty: it hangs on a building site. */
export function qrPath(text: string): QrPath {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: 'Q' });
  const rows = Array.from({ length: modules.size }, (_, row) =>
    Array.from({ length: modules.size }, (_, column) =>
      modules.get(row, column) ? `M${column + quiet} ${row + quiet}h1v1h-1z` : '',
    ).join(''),
  );
  return { size: modules.size + 2 * quiet, path: rows.join('') };
}
