import { ChevronsUpDown } from 'lucide-react';
import { generatePath } from 'react-router-dom';
import type { Membership } from '../../../../shared/account.ts';
import { Menu } from '../../../components/Menu.tsx';
import type { MenuItem } from '../../../components/Menu.tsx';
import { paths } from '../../../lib/paths.ts';

/** Switches between the person's groups and leads to the people of the current one. */
export function GroupMenu({ groups, current }: { groups: readonly Membership[]; current: Membership }) {
  const items: MenuItem[] = [
    { kind: 'heading', label: 'Your groups' },
    ...groups.map((group) => ({
      kind: 'link' as const,
      label: group.isDemo ? `${group.groupName} (demo)` : group.groupName,
      to: generatePath(paths.groupHome, { groupId: group.groupId }),
      current: group.groupId === current.groupId,
    })),
    { kind: 'separator', id: 'people' },
    {
      kind: 'link',
      label: 'People and links',
      to: generatePath(paths.people, { groupId: current.groupId }),
    },
  ];
  return (
    <Menu
      items={items}
      trigger={
        <button
          type="button"
          aria-label={`Group: ${current.groupName}. Switch group`}
          className="flex min-w-0 items-center gap-1 rounded-control px-2 py-1.5 hover:bg-accent-soft hover:text-accent"
        >
          <span className="max-w-32 truncate sm:max-w-52">{current.groupName}</span>
          <ChevronsUpDown aria-hidden="true" className="size-3.5 shrink-0" />
        </button>
      }
    />
  );
}
