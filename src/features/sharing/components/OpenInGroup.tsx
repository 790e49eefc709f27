import { useState } from 'react';
import type { Membership } from '../../../../shared/account.ts';
import type { Stack } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { Select } from '../../../components/Select.tsx';
import { useOpenInGroup } from '../api/sharedRun.ts';

type Props = {
  token: string;
  /** The groups in which the reader may make stacks. */
  groups: readonly Membership[];
  onOpened: (stack: Stack) => void;
};

/** Puts the stack of a shared run or design into one of the reader's own groups. */
export function OpenInGroup({ token, groups, onOpened }: Props) {
  const [chosen, setChosen] = useState(groups[0]?.groupId ?? '');
  const open = useOpenInGroup(token);
  if (groups.length === 0) {
    return <p className="text-note text-muted">To open it in a group you need to be an editor of one.</p>;
  }
  return (
    <div className="flex flex-wrap items-center gap-2">
      {groups.length > 1 && (
        <Select
          aria-label="Group to open it in"
          value={chosen}
          options={groups.map(({ groupId, groupName }) => ({ value: groupId, label: groupName }))}
          onValueChange={setChosen}
        />
      )}
      <Button
        tone="primary"
        busy={open.isPending}
        onClick={() => open.mutate(chosen, { onSuccess: onOpened })}
      >
        {groups.length > 1 ? 'Open in this group' : `Open in ${groups[0]?.groupName}`}
      </Button>
      {open.error && (
        <p role="alert" className="w-full text-note text-danger">
          {open.error.message}
        </p>
      )}
    </div>
  );
}
