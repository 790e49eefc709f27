import { Plus, X } from 'lucide-react';
import type { ReactNode } from 'react';
import { Button, IconButton } from '../../../components/Button.tsx';

type Props<Term> = {
  /** What one is called: "term", "line". */
  noun: string;
  terms: readonly Term[];
  most: number;
  onChange: (terms: Term[]) => void;
  /** A further one; several kinds have several buttons. */
  additions: readonly { label: string; make: () => Term }[];
  nameOf?: (term: Term) => string;
  children: (term: Term, position: number, change: (term: Term) => void) => ReactNode;
};

/** A list of like things that can be added to and taken from: terms of a sum, lines, wavelengths. */
export function TermList<Term>(props: Props<Term>) {
  const { noun, terms, most, onChange, additions, nameOf, children } = props;
  return (
    <div className="flex flex-col gap-3">
      {terms.map((term, position) => {
        const name = `${noun} ${position + 1}`;
        return (
          <div
            key={position}
            role="group"
            aria-label={nameOf ? `${name}, ${nameOf(term)}` : name}
            className="relative border-l-2 border-line pr-9 pl-3"
          >
            <p className="mb-1 text-note text-muted">
              <span className="inline-block first-letter:uppercase">{name}</span>
              {nameOf ? `: ${nameOf(term)}` : ''}
            </p>
            <div className="flex flex-wrap items-start gap-3">
              {children(term, position, (next) =>
                onChange(terms.map((one, at) => (at === position ? next : one))),
              )}
            </div>
            {terms.length > 1 ? (
              <IconButton
                label={`Remove ${name}`}
                className="absolute -top-1.5 right-0"
                onClick={() => onChange(terms.filter((_, at) => at !== position))}
              >
                <X aria-hidden="true" className="size-4" />
              </IconButton>
            ) : null}
          </div>
        );
      })}
      {terms.length < most ? (
        <div className="flex flex-wrap gap-1.5">
          {additions.map(({ label, make }) => (
            <Button
              key={label}
              className="py-1!"
              icon={<Plus aria-hidden="true" className="size-4" />}
              onClick={() => onChange([...terms, make()])}
            >
              {label}
            </Button>
          ))}
        </div>
      ) : (
        <p className="text-note text-muted">{most} at most.</p>
      )}
    </div>
  );
}
