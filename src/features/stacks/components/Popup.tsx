import { Popover } from 'radix-ui';
import type { ReactNode } from 'react';

type Props = {
  /** The button that opens it. */
  trigger: ReactNode;
  /** What it is for, read by screen readers. */
  label: string;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  className?: string;
  children: ReactNode;
};

/** A small panel beside the number it edits; the drawing stays in sight and goes on changing. */
export function Popup({ trigger, label, open, onOpenChange, className = 'w-80', children }: Props) {
  return (
    <Popover.Root {...(open === undefined ? {} : { open })} {...(onOpenChange ? { onOpenChange } : {})}>
      <Popover.Trigger asChild>{trigger}</Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          aria-label={label}
          align="start"
          sideOffset={6}
          collisionPadding={12}
          className={`card z-40 max-w-[calc(100vw-24px)] p-3.5 shadow-float ${className}`}
        >
          {children}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
