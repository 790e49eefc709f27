import { memo } from 'react';
import { formatDepth } from '../model/depthScale.ts';

type Props = { depthNm: number; atTop?: boolean };

/** The depth of a face beside the drawing, at the lower edge of the row it stands in. */
export const DepthTick = memo(function DepthTick({ depthNm, atTop = false }: Props) {
  return (
    <span
      aria-hidden="true"
      className={`pointer-events-none absolute right-full flex items-center text-tick whitespace-nowrap text-muted ${
        atTop ? 'top-0 -translate-y-1/2' : 'bottom-0 translate-y-1/2'
      }`}
    >
      {formatDepth(depthNm)}
      <span className="ml-1 inline-block h-px w-1.5 bg-muted" />
    </span>
  );
});
