import type { ReactNode } from 'react';
import type { Vector } from '../../../../shared/complex.ts';
import { describeM } from '../model/magnetization.ts';
import { DirectionDial } from './DirectionDial.tsx';
import { DirectionForm } from './DirectionForm.tsx';
import { Popup } from './Popup.tsx';

type Props = {
  m: Vector;
  label: string;
  fixed: boolean;
  onChange?: ((m: Vector) => void) | undefined;
  /** Below the form of m, such as the temperature. */
  children?: ReactNode;
};

/** m of a layer: the arrow to drag, and its geometry, which opens the exact form. */
export function MagnetizationChip({ m, label, fixed, onChange, children }: Props) {
  const text = describeM(m) + (fixed ? ', fixed' : '');
  return (
    <span className="inline-flex items-center rounded-box bg-paper/85 whitespace-nowrap">
      <DirectionDial m={m} label={label} onChange={onChange} />
      {onChange ? (
        <Popup
          label={`Magnetization of ${label}`}
          trigger={
            <button
              type="button"
              aria-label={`Magnetization of ${label}: ${text}`}
              className="rounded-box py-[3px] pr-2 pl-0.5 text-note ring-1 ring-transparent hover:ring-edge aria-expanded:ring-2 aria-expanded:ring-accent"
            >
              {text}
            </button>
          }
        >
          <DirectionForm m={m} label={label} onChange={onChange} />
          {children}
        </Popup>
      ) : (
        <span aria-hidden="true" className="py-[3px] pr-2 pl-0.5 text-note">
          {text}
        </span>
      )}
    </span>
  );
}
