import { generatePath } from 'react-router-dom';
import { ButtonLink } from '../../../components/Button.tsx';
import { paths } from '../../../lib/paths.ts';

/** Leads to the comparison with what is picked; whatever is missing is chosen there. */
export function CompareLink({ groupId, picked }: { groupId: string; picked: readonly string[] }) {
  const search = new URLSearchParams();
  const [a, b] = picked;
  if (a) search.set('a', a);
  if (b) search.set('b', b);
  return (
    <ButtonLink to={{ pathname: generatePath(paths.compareMaterials, { groupId }), search: String(search) }}>
      Compare
      <span aria-live="polite">{picked.length > 0 ? ` (${picked.length} of 2 picked)` : ''}</span>
    </ButtonLink>
  );
}
