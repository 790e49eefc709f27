import { useState } from 'react';
import { Button } from './Button.tsx';
import { ConfirmDialog } from './ConfirmDialog.tsx';

type DeleteButtonProps = {
  /** Such as `Delete the run “…”?` */
  title: string;
  /** What goes with it and what stays. */
  description: string;
  /** On the button that does it, such as "Delete run". */
  action: string;
  /** The mutation that deletes it. */
  remove: {
    isPending: boolean;
    error: Error | null;
    mutate: (variables: undefined, options: { onSuccess: () => void }) => void;
  };
  onDeleted: () => void;
};

/** Deletes something after a question. */
export function DeleteButton({ title, description, action, remove, onDeleted }: DeleteButtonProps) {
  const [asked, setAsked] = useState(false);
  return (
    <>
      <Button tone="danger" onClick={() => setAsked(true)}>
        Delete
      </Button>
      <ConfirmDialog
        open={asked}
        onOpenChange={setAsked}
        title={title}
        description={description}
        action={action}
        busy={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(undefined, { onSuccess: onDeleted })}
      />
    </>
  );
}
