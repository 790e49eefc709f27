import type { ReactNode } from 'react';
import type { StackDocument, StackLayer } from '../../../../shared/stack.ts';
import { formatDepth } from '../model/depthScale.ts';
import { mediumClass, mediumName } from '../model/media.ts';
import { classFill } from './classColours.ts';
import { useFilm } from './film.ts';

/** A graded interface: the colour of the medium above runs out into the layer. */
export function GradedBand({ fillAbove }: { fillAbove: string }) {
  return (
    <span
      aria-hidden="true"
      className="pointer-events-none absolute inset-x-0 -top-[2px] z-[1] h-3.5"
      style={{ background: `linear-gradient(${fillAbove}, transparent)` }}
    />
  );
}

/** The parts at the top of a layer that are not the layer as it was deposited: its oxide, its dead part. */
export function TopParts({ layer }: { layer: StackLayer }) {
  const { materials } = useFilm();
  const { oxide, dead } = layer;
  return (
    <>
      {oxide && oxide.consumedNm > 0 && (
        <Strip fill={classFill[mediumClass(oxide.medium, materials)]}>
          {mediumName(oxide.medium, materials)} {formatDepth(oxide.consumedNm * oxide.expansion)} nm, from{' '}
          {formatDepth(oxide.consumedNm)} nm
        </Strip>
      )}
      {dead && dead.topNm > 0 && <DeadPart layer={layer} nm={dead.topNm} />}
    </>
  );
}

/** The dead part at the bottom of a layer. */
export function BottomPart({ layer }: { layer: StackLayer }) {
  const nm = layer.dead?.bottomNm ?? 0;
  return nm > 0 ? <DeadPart layer={layer} nm={nm} /> : null;
}

/** Without hatching: this part carries no magnetization. */
function DeadPart({ layer, nm }: { layer: StackLayer; nm: number }) {
  const { materials } = useFilm();
  return <Strip fill={classFill[mediumClass(layer.medium, materials)]}>dead {formatDepth(nm)} nm</Strip>;
}

function Strip({ fill, children }: { fill: string; children: ReactNode }) {
  return (
    <div
      className="relative border-y border-dashed border-edge/60 pl-7 text-tick leading-[15px] text-ink"
      style={{ background: fill }}
    >
      {children}
    </div>
  );
}

/** A slab far thicker than can be drawn: a break in the substrate, and what lies behind it. */
export function SlabBreak({ backside }: { backside: NonNullable<StackDocument['backside']> }) {
  const { materials } = useFilm();
  return (
    <div className="mt-2 text-tick text-ink">
      <svg
        viewBox="0 0 320 12"
        preserveAspectRatio="none"
        aria-hidden="true"
        className="h-3 w-full fill-none stroke-edge"
      >
        {[0, 5].map((y) => (
          <path
            key={y}
            d={`M0 ${y + 4}${Array.from({ length: 16 }, (_, i) => `l10 ${i % 2 === 0 ? -3 : 3}l10 ${i % 2 === 0 ? 3 : -3}`).join('')}`}
            vectorEffect="non-scaling-stroke"
          />
        ))}
      </svg>
      <p className="px-5">
        slab of {formatDepth(backside.thicknessNm)}
        {backside.thicknessNm < 1e4 ? ' nm' : ''}, back face to {mediumName(backside.exit, materials)},
        reflections add in intensity
      </p>
    </div>
  );
}
