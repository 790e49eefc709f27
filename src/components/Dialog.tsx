import { Dialog as Radix } from 'radix-ui';
import { useRef } from 'react';
import type { ReactNode } from 'react';

type DialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  description?: ReactNode;
  children: ReactNode;
};

/** Only for what must be decided before anything else goes on, such as deleting. Forms belong on the page. */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  // Radix knows where to lead the focus back to only for dialogs that hold their own trigger.
  const opener = useRef<Element | null>(null);
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-black/40" />
        <Radix.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          onOpenAutoFocus={() => (opener.current = document.activeElement)}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            if (opener.current instanceof HTMLElement) opener.current.focus();
          }}
          className="card fixed top-1/2 left-1/2 z-50 flex max-h-[90dvh] w-[min(440px,calc(100vw-32px))] -translate-x-1/2 -translate-y-1/2 flex-col gap-3 overflow-auto p-5 shadow-float"
        >
          <Radix.Title className="text-lead font-semibold">{title}</Radix.Title>
          {description ? (
            <Radix.Description asChild>
              <div className="text-muted">{description}</div>
            </Radix.Description>
          ) : null}
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
