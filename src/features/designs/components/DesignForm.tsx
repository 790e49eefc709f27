import { useState } from 'react';
import type { Design, DesignKind } from '../../../../shared/design.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { Stack } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { IssueContext } from '../hooks/issueContext.ts';
import { useDesignForm } from '../hooks/useDesignForm.ts';
import type { PickMaterial } from '../model/pickMaterial.ts';
import { startInput } from '../model/startInput.ts';
import { CapForm } from './CapForm.tsx';
import { OptimiseForm } from './OptimiseForm.tsx';
import { ToleranceForm } from './ToleranceForm.tsx';

type Props = {
  kind: DesignKind;
  stack: Stack;
  library: readonly MaterialSummary[];
  pickMaterial: PickMaterial;
  onStarted: (design: Design) => void;
};

const noIssues: never[] = [];

/** A design question about one stack, from its film and working point to the start of the calculation. */
export function DesignForm({ kind, stack, library, pickMaterial, onStarted }: Props) {
  const [start] = useState(() => startInput(kind, stack.document, library));
  const form = useDesignForm({
    groupId: stack.groupId,
    stackId: stack.id,
    start,
    // Another version of the stack is another film: what was filled in for the old one is not put over it.
    keptUnder: `${kind}.${stack.id}.${stack.version}`,
    onStarted,
  });
  const { draft, refusal } = form;
  const { input } = draft;
  return (
    <IssueContext value={refusal?.issues ?? noIssues}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          if (!form.busy) form.submit();
        }}
      >
        {form.restored && (
          <p role="status" className="text-note text-muted">
            What you had filled in is back.{' '}
            <button type="button" className="prose-link" onClick={form.startAnew}>
              Start anew
            </button>
          </p>
        )}
        <Field label="Name (made from the question when empty)" className="max-w-lg">
          {(control) => (
            <TextInput
              {...control}
              value={draft.name}
              onChange={(event) => form.rename(event.target.value)}
            />
          )}
        </Field>
        {input.kind === 'cap' && (
          <CapForm input={input} materials={library} pickMaterial={pickMaterial} onChange={form.editInput} />
        )}
        {input.kind === 'optimise' && (
          <OptimiseForm input={input} materials={library} onChange={form.editInput} />
        )}
        {input.kind === 'tolerance' && (
          <ToleranceForm input={input} materials={library} onChange={form.editInput} />
        )}
        {refusal && (
          <div role="alert" className="rounded-control bg-danger-soft px-3 py-2 text-note text-danger">
            {refusal.message}
            <ul className="list-disc pl-5">
              {refusal.issues.map(({ path, message }) => (
                <li key={path + message}>
                  {path}: {message}
                </li>
              ))}
            </ul>
          </div>
        )}
        <Button type="submit" tone="primary" className="self-start" busy={form.busy}>
          {buttonWords[kind]}
        </Button>
      </form>
    </IssueContext>
  );
}

const buttonWords: Record<DesignKind, string> = {
  cap: 'Compare the caps',
  optimise: 'Search the best film',
  tolerance: 'Draw the films',
};
