import { useMemo } from 'react';
import type { PlotTokens } from '../plotTokens.ts';
import { contourLines } from './contourLines.ts';
import { imageOf } from './drawMap.ts';
import type { MapPicture } from './drawMap.ts';
import { colourTable } from './mapColours.ts';
import { layoutMap } from './mapLayout.ts';
import type { MapWindow, Size } from './mapLayout.ts';
import { mapPixels } from './mapPixels.ts';
import type { ColourDomain } from './mapRange.ts';
import type { MapAxes } from './mapText.ts';
import type { MapData } from './mapTypes.ts';

/** A map ready to be drawn. Zooming draws the same picture in another place; only new values make a new one. */
export function useMapPicture(
  data: MapData,
  axes: MapAxes,
  domain: ColourDomain,
  window: MapWindow,
  size: Size,
  tokens: PlotTokens,
  withContours: boolean,
): MapPicture {
  const table = useMemo(() => colourTable(tokens, domain.signed), [tokens, domain.signed]);
  const image = useMemo(
    () => imageOf(mapPixels(data, domain, table), data.x.length, data.y.length),
    [data, domain, table],
  );
  const layout = useMemo(() => layoutMap(window, axes, domain, size), [window, axes, domain, size]);
  const levels = layout.levels.join();
  const contours = useMemo(
    () => (withContours ? contourLines(data, levels.split(',').map(Number)) : []),
    [data, levels, withContours],
  );
  return useMemo(
    () => ({ layout, data, image, domain, table, contours, axes, size, tokens }),
    [layout, data, image, domain, table, contours, axes, size, tokens],
  );
}
