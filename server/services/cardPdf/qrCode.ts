import QRCode from 'qrcode';

/**
 * A QR code as black squares, sharp at any size of print. Rows of dark squares are drawn as one rectangle each, so that no
 * hairline shows between them.
 *
 * @param side of the code without its quiet zone, points
 */
export function drawQrCode(doc: PDFKit.PDFDocument, text: string, x: number, y: number, side: number): void {
  const { size, data } = QRCode.create(text, { errorCorrectionLevel: 'M' }).modules;
  const step = side / size;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) {
      let end = column;
      while (end < size && data[row * size + end]) end += 1;
      if (end === column) continue;
      doc.rect(x + column * step, y + row * step, (end - column) * step, step);
      column = end;
    }
  }
  doc.fillColor('black').fill();
}
