import type { ReactNode } from 'react';
import type { StackMedium } from '../../../../shared/stack.ts';

/** Draws the control that chooses a medium. */
export type PickMedium = (props: {
  medium: StackMedium;
  label: string;
  onChange: (medium: StackMedium) => void;
}) => ReactNode;
