import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ErrorState } from '../../../components/ErrorState.tsx';
import { LoadingState } from '../../../components/LoadingState.tsx';
import { paths } from '../../../lib/paths.ts';
import { sessionQuery } from '../api/session.ts';

/** The pages that need a sign-in. Without one, goes to sign-in and comes back to the same address after it. */
export function RequireSession() {
  const session = useQuery(sessionQuery());
  const location = useLocation();
  if (session.data) return <Outlet />;
  if (session.data === null) {
    const here = location.pathname + location.search + location.hash;
    const back = here === paths.start ? '' : `?${new URLSearchParams({ return: here }).toString()}`;
    return <Navigate to={paths.signIn + back} replace />;
  }
  return (
    <div className="mx-auto max-w-[1280px] px-4 py-8 sm:px-6">
      {session.isError ? (
        <ErrorState
          title="Your session could not be checked"
          error={session.error}
          onRetry={() => void session.refetch()}
        />
      ) : (
        <LoadingState label="Loading" />
      )}
    </div>
  );
}
