import { useState } from 'react';
import type { ReactNode } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackMedium } from '../../../../shared/stack.ts';
import { Tabs } from '../../../components/Tabs.tsx';
import { mediumName } from '../model/media.ts';
import { ConstantsForm } from './ConstantsForm.tsx';
import { MaterialSearch } from './MaterialSearch.tsx';
import { Popup } from './Popup.tsx';
import { useFilm } from './film.ts';

type Props = {
  medium: StackMedium;
  /** What the medium is of, such as "layer 2". */
  label: string;
  lossless?: boolean;
  /** `edit` names the edit, so that typing a constant is one step of undo. */
  onChange: (medium: StackMedium, edit: string | null) => void;
  className?: string;
  children: ReactNode;
};

/** Whether light may come through it: neither magnetic nor with axes of its own. */
function isPlain({ voigtRangeNm, anisotropy }: MaterialSummary): boolean {
  return voigtRangeNm === null && anisotropy === null;
}

/** The name of a medium as a button that opens the library, or constants typed in. */
export function MediumPicker({ medium, label, lossless = false, onChange, className = '', children }: Props) {
  const film = useFilm();
  const [open, setOpen] = useState(false);
  const [way, setWay] = useState<'library' | 'constants'>(
    medium.material === undefined ? 'constants' : 'library',
  );
  return (
    <Popup
      open={open}
      onOpenChange={setOpen}
      label={`Material of ${label}`}
      className="w-96"
      trigger={
        <button
          type="button"
          aria-label={`Material of ${label}: ${mediumName(medium, film.materials)}`}
          className={`rounded-box px-2 py-[2px] ring-1 ring-transparent hover:ring-edge aria-expanded:ring-2 aria-expanded:ring-accent ${className}`}
        >
          {children}
        </button>
      }
    >
      <Tabs
        label="Where the constants come from"
        value={way}
        onValueChange={setWay}
        tabs={[
          { value: 'library', label: 'Library' },
          { value: 'constants', label: 'Type in' },
        ]}
      >
        <div className="pt-3">
          {way === 'library' ? (
            <MaterialSearch
              materials={lossless ? film.library.filter(isPlain) : film.library}
              chosen={medium.material}
              onChoose={({ id, version }) => {
                onChange({ material: id, version }, null);
                setOpen(false);
              }}
            />
          ) : (
            <ConstantsForm
              medium={medium}
              lossless={lossless}
              onChange={(next) => onChange(next, `constants of ${label}`)}
            />
          )}
        </div>
      </Tabs>
    </Popup>
  );
}
