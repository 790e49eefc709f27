import { ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { paths } from '../../lib/paths.ts';

export function NotFoundPage() {
  return (
    <Page title="Nothing at this address" width="text">
      <EmptyState
        title="There is no such page"
        action={
          <ButtonLink to={paths.start} tone="primary">
            To the stacks
          </ButtonLink>
        }
      >
        Check the address for a missing end, as happens when a link breaks over two lines of a mail.
      </EmptyState>
    </Page>
  );
}
