import { AppShell } from '../../components/AppShell.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { paths } from '../../lib/paths.ts';

/** What stands there while the code of the first page is on its way. */
export function StartingUp() {
  return (
    <AppShell home={paths.start} links={[]} right={null}>
      <div className="mx-auto max-w-[1280px] px-4 py-8 sm:px-6">
        <LoadingState label="Loading Skewlight" />
      </div>
    </AppShell>
  );
}
