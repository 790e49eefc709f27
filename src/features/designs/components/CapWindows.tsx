import type { CapOutcome, CapResult } from '../../../../shared/capDesign.ts';
import type { PlotLayout } from '../../../components/plot/plotLayout.ts';
import { toPixel } from '../../../components/plot/plotScale.ts';
import { SeriesMark } from '../../../components/plot/SeriesMark.tsx';
import { formatNumber } from '../../../lib/format.ts';
import { capLook } from '../model/capSeries.ts';
import { windowWords } from '../model/windowWords.ts';

const HEIGHT = 16;

/**
 * Under the x axis, for each candidate: a low bar where all demands hold for the film as drawn, a high one where
 * enough of the films with errors meet them, and a diamond at the best thickness.
 */
export function CapWindows({ result, layout }: { result: CapResult; layout: PlotLayout }) {
  return (
    <div className="mt-1">
      <p className="mb-1 text-note text-muted" style={{ paddingLeft: layout.frame.left }}>
        Where all demands hold: outline for the film as drawn, filled for enough of the films with errors,
        diamond at the best thickness.
      </p>
      <ul>
        {result.candidates.map((candidate, position) => (
          <li key={candidate.id} className="mb-1.5">
            <div
              className="flex flex-wrap items-center gap-x-2 text-note"
              style={{ paddingLeft: layout.frame.left }}
            >
              <SeriesMark series={{ tone: 'ink', ...capLook(position) }} />
              <b className="font-semibold">{candidate.label}</b>
              <span className="text-muted">{barWords(candidate)}</span>
            </div>
            <Bars candidate={candidate} layout={layout} />
          </li>
        ))}
      </ul>
    </div>
  );
}

function barWords({ windows, best }: CapOutcome): string {
  const at = best ? `, best ${formatNumber(best.thicknessNm, { digits: 3 })} nm` : '';
  return windows.length === 0 ? `no window${at}` : `${windowWords(windows)}${at}`;
}

function Bars({ candidate, layout }: { candidate: CapOutcome; layout: PlotLayout }) {
  const { frame, x } = layout;
  const place = (nm: number) => toPixel(x, Math.min(Math.max(nm, x.min), x.max));
  const bar = (window: { fromNm: number; toNm: number }) => ({
    x: place(window.fromNm),
    width: Math.max(1, place(window.toNm) - place(window.fromNm)),
  });
  const seen = (window: { fromNm: number; toNm: number }) => window.toNm >= x.min && window.fromNm <= x.max;
  const best = candidate.best?.thicknessNm;
  return (
    <svg width="100%" height={HEIGHT} aria-hidden="true" focusable="false" className="block">
      <line
        x1={frame.left}
        x2={frame.right}
        y1={HEIGHT / 2}
        y2={HEIGHT / 2}
        stroke="var(--line)"
        strokeWidth="1"
      />
      {candidate.windows.filter(seen).map((window) => (
        <rect
          key={window.fromNm}
          {...bar(window)}
          y={2.5}
          height={HEIGHT - 5}
          fill="var(--panel)"
          stroke="var(--accent)"
          strokeWidth="1.4"
        />
      ))}
      {candidate.robustWindows.filter(seen).map((window) => (
        <rect key={window.fromNm} {...bar(window)} y={5} height={HEIGHT - 10} fill="var(--accent)" />
      ))}
      {best !== undefined && best >= x.min && best <= x.max && (
        <path
          d={`M${place(best)} 0l6 ${HEIGHT / 2}l-6 ${HEIGHT / 2}l-6 ${-HEIGHT / 2}z`}
          fill="var(--ink)"
          stroke="var(--panel)"
          strokeWidth="1.5"
        />
      )}
    </svg>
  );
}
