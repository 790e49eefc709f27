import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { Dialog } from './Dialog.tsx';
import { FormError } from './Field.tsx';

type ConfirmDialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** What will be gone and what stays. */
  description: ReactNode;
  /** The verb, such as "Delete stack". */
  action: string;
  busy: boolean;
  error: string | undefined;
  onConfirm: () => void;
};

/** Asks before something is destroyed. The cancel button has the focus at first. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const { open, onOpenChange, title, description, action, busy, error, onConfirm } = props;
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={title} description={description}>
      <FormError message={error} />
      <div className="flex justify-end gap-2">
        <Button onClick={() => onOpenChange(false)}>Cancel</Button>
        <Button tone="danger" busy={busy} onClick={onConfirm}>
          {action}
        </Button>
      </div>
    </Dialog>
  );
}
