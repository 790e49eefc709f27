import { Check } from 'lucide-react';
import type { ReactNode } from 'react';

export type StepState = 'done' | 'open' | 'waiting';

export const importSteps = [
  { id: 'table', title: 'The table' },
  { id: 'columns', title: 'What the columns are' },
  { id: 'signs', title: 'Signs of the source' },
  { id: 'result', title: 'The converted constants' },
  { id: 'keep', title: 'Name and source' },
] as const;

export type StepId = (typeof importSteps)[number]['id'];

const stateWords: Record<StepState, string> = { done: 'done', open: 'to do', waiting: 'not yet' };

/** Where a person is: five steps on one page, each a link to its place. */
export function StepList({ states }: { states: Record<StepId, StepState> }) {
  return (
    <nav aria-label="Steps of the import" className="mb-4">
      <ol className="flex flex-wrap gap-x-5 gap-y-1.5">
        {importSteps.map(({ id, title }, place) => (
          <li key={id}>
            <a
              href={`#step-${id}`}
              className={`inline-flex items-center gap-2 no-underline hover:underline ${states[id] === 'waiting' ? 'text-muted' : 'text-ink'}`}
            >
              <StepMark number={place + 1} state={states[id]} />
              {title}
              <span className="sr-only">, {stateWords[states[id]]}</span>
            </a>
          </li>
        ))}
      </ol>
    </nav>
  );
}

function StepMark({ number, state }: { number: number; state: StepState }) {
  const looks: Record<StepState, string> = {
    done: 'border-accent bg-accent text-on-accent',
    open: 'border-accent text-accent',
    waiting: 'border-edge text-muted',
  };
  return (
    <span
      aria-hidden="true"
      className={`inline-flex size-[22px] shrink-0 items-center justify-center rounded-full border text-small font-semibold ${looks[state]}`}
    >
      {state === 'done' ? <Check className="size-3.5" /> : number}
    </span>
  );
}

type ImportStepProps = {
  id: StepId;
  state: StepState;
  /** What must happen before, while it waits. */
  waitsFor?: string;
  children?: ReactNode;
};

export function ImportStep({ id, state, waitsFor, children }: ImportStepProps) {
  const place = importSteps.findIndex((step) => step.id === id);
  return (
    <section
      id={`step-${id}`}
      aria-labelledby={`heading-${id}`}
      className={`card min-w-0 px-4 py-3.5 ${state === 'waiting' ? 'border-dashed! bg-transparent!' : ''}`}
    >
      <h2
        id={`heading-${id}`}
        className={`flex items-center gap-2.5 text-lead ${state === 'waiting' ? 'text-muted' : 'mb-3'}`}
      >
        <StepMark number={place + 1} state={state} />
        <span>
          <span className="sr-only">Step {place + 1}: </span>
          {importSteps[place]?.title}
          <span className="sr-only"> ({stateWords[state]})</span>
        </span>
        {state === 'waiting' && waitsFor ? (
          <span className="text-note font-normal tracking-normal text-muted">{waitsFor}</span>
        ) : null}
      </h2>
      {state === 'waiting' ? null : children}
    </section>
  );
}
