import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { ErrorState } from '../../components/ErrorState.tsx';
import { Page } from '../../components/Page.tsx';

/** What a page shows when drawing it failed: the reason and a way on. */
export function RouteError() {
  const error = useRouteError();
  // After an update of the server the old page asks for files that are no longer there.
  const outdated = error instanceof Error && /dynamically imported module|module script/i.test(error.message);
  const shown = isRouteErrorResponse(error) ? new Error(`${error.status} ${error.statusText}`) : error;
  return (
    <Page title={outdated ? 'Skewlight was updated' : 'This page failed'} width="text">
      <ErrorState
        title={
          outdated
            ? 'A part of this page could not be loaded'
            : 'Something went wrong while drawing this page'
        }
        error={shown}
        onRetry={() => window.location.reload()}
      />
    </Page>
  );
}
