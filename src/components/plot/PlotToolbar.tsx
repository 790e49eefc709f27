import { Minus, Plus, RotateCcw } from 'lucide-react';
import type { ReactNode } from 'react';

type ButtonProps = { label: string; onClick: () => void; disabled?: boolean; children: ReactNode };

/** A quiet button of a figure: an icon or a word, always with a name. */
export function PlotButton({ label, onClick, disabled = false, children }: ButtonProps) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      disabled={disabled}
      onClick={onClick}
      className="text-muted hover:bg-accent-soft hover:text-accent inline-flex h-7 min-w-7 items-center justify-center rounded-md px-1.5 text-[12.5px] disabled:opacity-40 disabled:hover:bg-transparent"
    >
      {children}
    </button>
  );
}

type Props = {
  zoomed: boolean;
  onZoom: (factor: number) => void;
  onReset: () => void;
  onSvg: () => void;
  onPng: () => void;
  /** Controls of the page, such as the choice of curves. */
  children?: ReactNode;
  /** Further files beside the pictures, such as CSV. */
  downloads?: ReactNode;
};

export function PlotToolbar({ zoomed, onZoom, onReset, onSvg, onPng, children, downloads }: Props) {
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
        <PlotButton label="Download the figure as PNG" onClick={onPng}>
          PNG
        </PlotButton>
        <PlotButton label="Download the figure as SVG" onClick={onSvg}>
          SVG
        </PlotButton>
      </div>
    </div>
  );
}
