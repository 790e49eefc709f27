import { useQuery } from '@tanstack/react-query';
import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { StackMedium } from '../../../shared/stack.ts';
import { EmptyState } from '../../components/EmptyState.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { NewCardForm } from '../../features/cards/components/NewCardForm.tsx';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { formatFormula } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { useCardStart } from './useCardStart.ts';

/** `/groups/:groupId/cards/new?stack=` or `?design=&candidate=`, each with `&study=`: what the card says. */
export function NewCardPage() {
  return <GroupGate>{(group) => <NewCard key={group.groupId} group={group} />}</GroupGate>;
}

function NewCard({ group }: { group: Membership }) {
  const { groupId } = group;
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const { start, error, retry } = useCardStart(search);
  const library = useQuery(materialListQuery(groupId));
  const nameOf = ({ label, material }: StackMedium) => {
    const known = library.data?.materials.find(({ id }) => id === material);
    return label ?? (known ? formatFormula(known.formula) : (material ?? 'typed-in constants'));
  };
  const content = () => {
    if (!mayEdit(group)) {
      return (
        <EmptyState title="You may look at cards here, not make them">
          Ask an owner of the group for the role of an editor.
        </EmptyState>
      );
    }
    if (error) return <ErrorState title="The film could not be loaded" error={error} onRetry={retry} />;
    if (start === 'missing') {
      return (
        <EmptyState title="A card is made of a film">
          Open a stack or a design and choose “Growth card” there.
        </EmptyState>
      );
    }
    if (start === null || library.isPending) return <LoadingState label="Loading the film" />;
    return (
      <NewCardForm
        groupId={groupId}
        start={start}
        keptUnder={`${groupId}?${search.toString()}`}
        nameOf={nameOf}
        onMade={({ id }) => void navigate(generatePath(paths.card, { cardId: id }))}
      />
    );
  };
  return (
    <Page title="New growth card" subtitle="One page for the chamber. A card never changes once it is made.">
      {content()}
    </Page>
  );
}
