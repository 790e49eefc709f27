import { Popover } from 'radix-ui';
import { useRef } from 'react';
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
  const content = useRef<HTMLDivElement>(null);
  return (
    <Popover.Root {...(open === undefined ? {} : { open })} {...(onOpenChange ? { onOpenChange } : {})}>
      <Popover.Trigger asChild>{trigger}</Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          ref={content}
          aria-label={label}
          align="start"
          sideOffset={6}
          collisionPadding={12}
          onOpenAutoFocus={(event) => {
            const wanted = content.current?.querySelector<HTMLElement>('[data-autofocus]');
            if (!wanted) return;
            event.preventDefault();
            wanted.focus();
          }}
          className={`card z-40 max-h-(--radix-popover-content-available-height) max-w-[calc(100vw-24px)] overflow-y-auto p-3.5 shadow-float ${className}`}
        >
          {children}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
