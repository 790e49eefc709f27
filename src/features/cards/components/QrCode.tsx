import { create } from 'qrcode';
import { useMemo } from 'react';

/** Light modules around the code, which a reader needs to find it. */
const QUIET = 4;

/** An address as a QR code, dark on white in either theme: cameras read nothing else. */
export function QrCode({ text, label }: { text: string; label: string }) {
  const { size, path } = useMemo(() => {
    const { modules } = create(text, { errorCorrectionLevel: 'M' });
    const cells = Array.from({ length: modules.size * modules.size }, (_, index) => index)
      .filter((index) => modules.data[index])
      .map(
        (index) => `M${(index % modules.size) + QUIET} ${Math.floor(index / modules.size) + QUIET}h1v1h-1z`,
      );
    return { size: modules.size + 2 * QUIET, path: cells.join('') };
  }, [text]);
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`0 0 ${size} ${size}`}
      className="size-28"
      shapeRendering="crispEdges"
    >
      <rect width={size} height={size} fill="#fff" />
      <path d={path} fill="#000" />
    </svg>
  );
}
