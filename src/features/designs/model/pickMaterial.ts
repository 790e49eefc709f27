import type { ReactNode } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';

/** A search of the library, put in by the page: features do not know each other. */
export type PickMaterial = (onChoose: (material: MaterialSummary) => void) => ReactNode;
