import { useMemo, useState } from 'react';
import type { MapWindow } from './mapLayout.ts';
import type { MapPlace } from './mapTypes.ts';

/** What somebody looks at in a map: the part that is shown, the point being read, and where the cut lies. */
export type MapLook = {
  zoom: MapWindow | null;
  setZoom: (zoom: MapWindow | null) => void;
  cursor: MapPlace | null;
  setCursor: (cursor: MapPlace | null) => void;
  pinned: MapPlace | null;
  setPinned: (pinned: MapPlace | null) => void;
  along: 'x' | 'y';
  setAlong: (along: 'x' | 'y') => void;
};

/** Given to several maps on one grid it makes them move together. */
export function useMapLook(): MapLook {
  const [zoom, setZoom] = useState<MapWindow | null>(null);
  const [cursor, setCursor] = useState<MapPlace | null>(null);
  const [pinned, setPinned] = useState<MapPlace | null>(null);
  const [along, setAlong] = useState<'x' | 'y'>('x');
  return useMemo(
    () => ({ zoom, setZoom, cursor, setCursor, pinned, setPinned, along, setAlong }),
    [zoom, cursor, pinned, along],
  );
}
