import { useQuery } from '@tanstack/react-query';
import { Link, generatePath, useSearchParams } from 'react-router-dom';
import type { Material, MaterialSummary } from '../../../shared/material.ts';
import { Field } from '../../components/Field.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { Select } from '../../components/Select.tsx';
import { materialUsesQuery } from '../../features/materials/api/materialUses.ts';
import { materialsIn } from '../../features/materials/model/exchangeMaterial.ts';
import { stackListQuery } from '../../features/stackList/api/stackList.ts';
import { stackQuery } from '../../features/stacks/api/stack.ts';
import { paths } from '../../lib/paths.ts';
import { EffectPlots } from './EffectPlots.tsx';

type Props = { groupId: string; a: Material; b: Material; library: readonly MaterialSummary[] };

/** What exchanging one material for the other does to a stack of the group; at first one that uses either. */
export function StackEffect({ groupId, a, b, library }: Props) {
  const [search, setSearch] = useSearchParams();
  const stacks = useQuery(stackListQuery(groupId));
  const usesA = useQuery(materialUsesQuery(a.id));
  const usesB = useQuery(materialUsesQuery(b.id));
  const listed = stacks.data?.stacks ?? [];
  const settled = !stacks.isPending && !usesA.isPending && !usesB.isPending;
  const using = [...(usesA.data?.stacks ?? []), ...(usesB.data?.stacks ?? [])].map(({ id }) => id);
  const stackId =
    listed.find(({ id }) => id === search.get('stack'))?.id ??
    (settled ? (listed.find(({ id }) => using.includes(id)) ?? listed[0])?.id : undefined);
  const stack = useQuery({ ...stackQuery(stackId ?? ''), enabled: stackId !== undefined });
  const put = (key: string, value: string) =>
    setSearch(
      (before) => {
        before.set(key, value);
        return before;
      },
      { replace: true },
    );
  const present = stack.data ? materialsIn(stack.data.document) : [];
  const outgoing = outgoingOf(present, search.get('place'), a, b, library);
  const formulaOf = (id: string) => library.find((one) => one.id === id)?.formula ?? id;
  return (
    <section aria-labelledby="effect-heading" className="card min-w-0 px-4 py-3.5">
      <div className="mb-3 flex flex-wrap items-end gap-x-4 gap-y-2">
        <h2 id="effect-heading" className="mr-auto py-2 text-lead">
          What it does to a stack
        </h2>
        {stackId === undefined ? null : (
          <Field label="Stack">
            {(control) => (
              <Select
                {...control}
                value={stackId}
                options={listed.map(({ id, name }) => ({ value: id, label: name }))}
                onValueChange={(id) => put('stack', id)}
              />
            )}
          </Field>
        )}
        {present.length > 0 ? (
          <Field label="A and B take the place of">
            {(control) => (
              <Select
                {...control}
                value={outgoing.join(' ')}
                options={[
                  ...(present.includes(outgoing.join(' ')) ? [] : [placeOption(outgoing, formulaOf)]),
                  ...present.map((id) => placeOption([id], formulaOf)),
                ]}
                onValueChange={(id) => {
                  if (present.includes(id)) put('place', id);
                }}
              />
            )}
          </Field>
        ) : null}
      </div>
      {settled && listed.length === 0 ? (
        <p className="text-muted">
          The group has no stack yet.{' '}
          <Link className="prose-link" to={generatePath(paths.groupHome, { groupId })}>
            Make one
          </Link>{' '}
          to see what the exchange does to it.
        </p>
      ) : (
        <QueryGate query={stack} what="stack">
          {({ document }) =>
            outgoing.length > 0 ? (
              <EffectPlots document={document} outgoing={outgoing} a={a} b={b} library={library} />
            ) : (
              <p className="text-muted">
                This stack has neither of the two. Choose the material in whose place they shall stand, or
                another stack.
              </p>
            )
          }
        </QueryGate>
      )}
    </section>
  );
}

function placeOption(ids: readonly string[], formulaOf: (id: string) => string) {
  const label = ids.map((id) => `${formulaOf(id)} (${id})`).join(' and ');
  return { value: ids.join(' '), label: label || 'Choose a material of the stack' };
}

/** What is exchanged: the one asked for, else whichever of the two is there, else another source of the substance. */
function outgoingOf(
  present: readonly string[],
  asked: string | null,
  a: Material,
  b: Material,
  library: readonly MaterialSummary[],
): string[] {
  if (asked !== null && present.includes(asked)) return [asked];
  const either = present.filter((id) => id === a.id || id === b.id);
  if (either.length > 0) return either;
  return present.filter((id) => {
    const formula = library.find((one) => one.id === id)?.formula;
    return formula === a.formula || formula === b.formula;
  });
}
