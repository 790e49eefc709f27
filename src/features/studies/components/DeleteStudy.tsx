import { useState } from 'react';
import type { Study } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useDeleteStudy } from '../api/changeStudy.ts';

export function DeleteStudy({ study, onDeleted }: { study: Study; onDeleted: () => void }) {
  const [asked, setAsked] = useState(false);
  const remove = useDeleteStudy(study);
  return (
    <>
      <Button onClick={() => setAsked(true)}>Delete</Button>
      <ConfirmDialog
        open={asked}
        onOpenChange={setAsked}
        title={`Delete “${study.title}”?`}
        description="Its notes, its decision and its history are gone for everybody in the group, and every share link to it stops to open. The runs and designs in it stay. This cannot be undone."
        action="Delete study"
        busy={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(undefined, { onSuccess: onDeleted })}
      />
    </>
  );
}
