import { useId } from 'react';
import type { MaterialClass } from '../../../../shared/material.ts';

const fills: Record<MaterialClass, string> = {
  magnet: 'bg-magnet-soft',
  noble: 'bg-noble',
  refractory: 'bg-refractory',
  dielectric: 'bg-dielectric',
  semiconductor: 'bg-semiconductor',
};

const names: Record<MaterialClass, string> = {
  magnet: 'magnet',
  noble: 'noble metal',
  refractory: 'refractory metal',
  dielectric: 'dielectric',
  semiconductor: 'semiconductor',
};

export function classLabel(materialClass: MaterialClass): string {
  return names[materialClass];
}

/** The colour of the cross-section beside the word; a magnet is hatched there and here. */
export function ClassMark({ of }: { of: MaterialClass }) {
  const hatch = useId();
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <span className={`relative size-3.5 overflow-hidden rounded-[3px] ring-1 ring-line ${fills[of]}`}>
        {of === 'magnet' ? (
          <svg aria-hidden="true" className="absolute inset-0 size-full">
            <defs>
              <pattern
                id={hatch}
                width="4"
                height="4"
                patternTransform="rotate(45)"
                patternUnits="userSpaceOnUse"
              >
                <line x1="0" y1="0" x2="0" y2="4" stroke="var(--magnet)" strokeWidth="1.6" opacity="0.6" />
              </pattern>
            </defs>
            <rect width="100%" height="100%" fill={`url(#${hatch})`} />
          </svg>
        ) : null}
      </span>
      {names[of]}
    </span>
  );
}
