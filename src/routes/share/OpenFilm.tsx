import { Link, generatePath, useNavigate } from 'react-router-dom';
import { mayEdit, useSession } from '../../features/session/hooks/useSession.ts';
import { OpenInGroup } from '../../features/sharing/components/OpenInGroup.tsx';
import { paths } from '../../lib/paths.ts';

/** Takes the film of a shared run or design into a group of the reader's, who has signed in. */
export function OpenFilm({ token }: { token: string }) {
  const session = useSession();
  const navigate = useNavigate();
  if (!session) return null;
  return (
    <OpenInGroup
      token={token}
      groups={session.groups.filter(mayEdit)}
      onOpened={({ id }) => void navigate(generatePath(paths.stack, { stackId: id }))}
    />
  );
}

/** What somebody who has not can do about it. */
export function SignInToOpen({ token }: { token: string }) {
  if (useSession()) return null;
  return (
    <p className="text-note text-muted">
      <Link className="prose-link" to={`${paths.signIn}?return=${encodeURIComponent(`/share/${token}`)}`}>
        Sign in
      </Link>{' '}
      to open this film in a group of your own and change it.
    </p>
  );
}
