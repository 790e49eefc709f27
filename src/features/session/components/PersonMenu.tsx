import { UserRound } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import type { Session } from '../../../../shared/account.ts';
import { Menu } from '../../../components/Menu.tsx';
import type { MenuItem } from '../../../components/Menu.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { paths } from '../../../lib/paths.ts';
import { chooseTheme, useThemeChoice } from '../../../lib/theme.ts';
import { useSignOut } from '../api/signOut.ts';

const themeNames = { system: 'Theme of the system', light: 'Light', dark: 'Dark' } as const;

/** Account, theme and the way out. */
export function PersonMenu({ session }: { session: Session }) {
  const choice = useThemeChoice();
  const signOut = useSignOut();
  const navigate = useNavigate();
  const notify = useNotify();
  const leave = () =>
    signOut.mutate(undefined, {
      onSuccess: () => void navigate(paths.signIn),
      onError: (error) => notify.problem(`Signing out failed: ${error.message}`),
    });
  const items: MenuItem[] = [
    { kind: 'heading', label: session.user.email },
    { kind: 'link', label: 'Account and API tokens', to: paths.account },
    { kind: 'separator', id: 'theme' },
    ...(['system', 'light', 'dark'] as const).map((theme) => ({
      kind: 'choice' as const,
      label: themeNames[theme],
      checked: choice === theme,
      onSelect: () => chooseTheme(theme),
    })),
    { kind: 'separator', id: 'out' },
    { kind: 'action', label: 'Sign out', onSelect: leave },
  ];
  return (
    <Menu
      items={items}
      trigger={
        <button
          type="button"
          aria-label={`${session.user.name}: account, theme, sign out`}
          className="flex items-center gap-1.5 rounded-control px-2 py-1.5 hover:bg-accent-soft hover:text-accent"
        >
          <UserRound aria-hidden="true" className="size-4" />
          <span className="max-md:hidden">{session.user.name}</span>
        </button>
      }
    />
  );
}
