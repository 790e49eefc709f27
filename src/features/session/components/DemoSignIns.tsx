import { useQuery } from '@tanstack/react-query';
import { Button } from '../../../components/Button.tsx';
import { healthQuery } from '../api/health.ts';
import { useSignIn } from '../api/signIn.ts';

const password = 'northgate-demo';
const demoPeople = [
  { email: 'lead@northgate.example', role: 'owner' },
  { email: 'grower@northgate.example', role: 'editor' },
  { email: 'theorist@northgate.example', role: 'editor' },
  { email: 'guest@northgate.example', role: 'viewer' },
] as const;

/** One press signs in as an invented person. Shown only where the server says that they exist. */
export function DemoSignIns({ onSignedIn }: { onSignedIn: () => void }) {
  const health = useQuery(healthQuery());
  const signIn = useSignIn();
  if (!health.data?.demo) return null;
  return (
    <section aria-labelledby="demo-heading" className="flex flex-col gap-2">
      <h2 id="demo-heading" className="text-body">
        Look around first
      </h2>
      <p className="text-note text-muted">
        Northgate Films is an invented group. Each of its people signs in with the password{' '}
        <code>{password}</code>.
      </p>
      <ul className="flex flex-col gap-1.5">
        {demoPeople.map(({ email, role }) => (
          <li key={email}>
            <Button
              className="w-full justify-between!"
              busy={signIn.isPending}
              onClick={() => signIn.mutate({ email, password }, { onSuccess: onSignedIn })}
            >
              {email}
              <span className="text-note font-normal text-muted">{role}</span>
            </Button>
          </li>
        ))}
      </ul>
      {signIn.isError ? (
        <p role="alert" className="text-note text-danger">
          {signIn.error.message}
        </p>
      ) : null}
    </section>
  );
}
