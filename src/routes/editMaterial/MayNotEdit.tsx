import { ErrorState } from '../../components/ErrorState.tsx';
import { Page } from '../../components/Page.tsx';
import { ApiError } from '../../lib/apiClient.ts';

/** For somebody who may look at the materials of a group and not change them. */
export function MayNotEdit() {
  return (
    <Page title="Materials are made by editors" width="text">
      <ErrorState
        error={
          new ApiError(
            403,
            'forbidden',
            'Your role in this group lets you look at materials, not change them.',
          )
        }
      />
    </Page>
  );
}
