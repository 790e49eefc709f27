import { Minus, Plus, RotateCcw } from 'lucide-react';
import type { ReactNode } from 'react';
import { PlotButton } from '../PlotToolbar.tsx';

type Props = {
  zoomed: boolean;
  onZoom: (factor: number) => void;
  onReset: () => void;
  onPng: () => void;
  downloads: ReactNode;
  children?: ReactNode;
};

/** The buttons of a map; a picture of a million values is no drawing of lines, so it has no SVG. */
export function MapToolbar({ zoomed, onZoom, onReset, onPng, downloads, children }: Props) {
  return (
    <div className="flex flex-wrap items-center gap-x-1 gap-y-1" data-screen-only>
      <div className="flex flex-wrap items-center gap-1">{children}</div>
      <div className="ml-auto flex items-center gap-0.5">
        <PlotButton label="Zoom in" onClick={() => onZoom(0.5)}>
          <Plus size={15} aria-hidden />
        </PlotButton>
        <PlotButton label="Zoom out" onClick={() => onZoom(2)} disabled={!zoomed}>
          <Minus size={15} aria-hidden />
        </PlotButton>
        <PlotButton label="Show the whole range" onClick={onReset} disabled={!zoomed}>
          <RotateCcw size={14} aria-hidden />
        </PlotButton>
        <span className="bg-line mx-1.5 h-4 w-px" aria-hidden />
        {downloads}
        <PlotButton label="Download the map as PNG" onClick={onPng}>
          PNG
        </PlotButton>
      </div>
    </div>
  );
}
