import { useMemo } from 'react';
import { LinePlot } from '../LinePlot.tsx';
import type { PlotSeries } from '../plotTypes.ts';
import { printValue } from './mapText.ts';
import type { MapAxes } from './mapText.ts';
import type { MapData, MapPlace, MapValue } from './mapTypes.ts';

type Props = {
  data: MapData;
  axes: MapAxes;
  value: MapValue;
  along: 'x' | 'y';
  onAlong: (along: 'x' | 'y') => void;
  /** Where the cut lies. */
  place: MapPlace;
  /** The point being read, marked on the cut. */
  reading: MapPlace;
  fileName: string;
  renderer?: 'canvas' | 'svg' | undefined;
};

/** The values along one line through the map, parallel to either axis. */
export function MapCut({ data, axes, value, along, onAlong, place, reading, fileName, renderer }: Props) {
  const series = useMemo((): PlotSeries[] => {
    const { x, y, values } = data;
    const { ix, iy } = place;
    const own = { name: value.name, tone: value.tone, ...looksOf(value) };
    if (along === 'x') {
      return [{ ...own, x, y: Float64Array.from(x, (_, i) => values[iy * x.length + i] ?? NaN) }];
    }
    return [{ ...own, x: y, y: Float64Array.from(y, (_, j) => values[j * x.length + ix] ?? NaN) }];
  }, [data, place, along, value]);
  const other = along === 'x' ? axes.y : axes.x;
  const held = along === 'x' ? data.y[place.iy] : data.x[place.ix];
  const marker = along === 'x' ? data.x[reading.ix] : data.y[reading.iy];
  return (
    <div className="mt-1 border-t border-line pt-1.5">
      <LinePlot
        series={series}
        xAxis={axes[along]}
        yAxes={[value.axis]}
        height={200}
        ariaLabel={`Cut through the map along ${axes[along].label}`}
        fileName={fileName}
        {...(marker === undefined ? {} : { marker })}
        {...(renderer ? { renderer } : {})}
        controls={
          <span className="flex flex-wrap items-center gap-1.5 text-note text-muted">
            <label className="inline-flex items-center gap-1">
              cut along
              <select
                value={along}
                onChange={(event) => onAlong(event.target.value === 'y' ? 'y' : 'x')}
                className="h-7 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
              >
                <option value="x">{axes.x.label}</option>
                <option value="y">{axes.y.label}</option>
              </select>
            </label>
            at {printValue(other, held ?? NaN)}; click the map to move it
          </span>
        }
      />
    </div>
  );
}

function looksOf({ dash, width }: MapValue): Pick<PlotSeries, 'dash' | 'width'> {
  return { ...(dash ? { dash } : {}), ...(width ? { width } : {}) };
}
