import type { ReactNode } from 'react';
import { useState } from 'react';
import type { DesignInput, DesignResult } from '../../../../shared/design.ts';
import { readDesignView, withDesignView } from '../model/designView.ts';
import type { DesignView } from '../model/designView.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { CapResultView } from './CapResultView.tsx';
import { OptimiseResultView } from './OptimiseResultView.tsx';
import type { FoundFilm } from './OptimiseResultView.tsx';
import { ToleranceResultView } from './ToleranceResultView.tsx';

type Props = {
  input: DesignInput;
  result: DesignResult;
  /** Names of the library's materials in the film; the design carries them. */
  materials: readonly NamedMaterial[];
  /** The part of the page's address that says what is shown; without it the view keeps that to itself. */
  search?: URLSearchParams;
  onSearch?: (search: URLSearchParams) => void;
  /** What people who may change something can do with a cap. */
  capActions?: (candidateId: string) => ReactNode;
  /** ... with a film that a search has found. */
  filmActions?: (film: FoundFilm) => ReactNode;
  /** Whether a search still goes on, so that what it has found changes. */
  running?: boolean;
};

/** The answer to a design question, read-only: cap chooser, best film or tolerance. */
export function DesignResultView({
  input,
  result,
  materials,
  search,
  onSearch,
  capActions,
  filmActions,
  running = false,
}: Props) {
  const [own, setOwn] = useState(() => search ?? new URLSearchParams());
  const shown = onSearch && search ? search : own;
  const view = readDesignView(shown, input);
  const onView = (change: Partial<DesignView>) => (onSearch ?? setOwn)(withDesignView(shown, change));

  if (input.kind === 'cap' && result.kind === 'cap') {
    return (
      <CapResultView
        input={input}
        result={result}
        view={view}
        onView={onView}
        {...(capActions ? { actions: capActions } : {})}
      />
    );
  }
  if (input.kind === 'optimise' && result.kind === 'optimise') {
    return (
      <OptimiseResultView
        input={input}
        result={result}
        materials={materials}
        view={view}
        onView={onView}
        running={running}
        {...(filmActions ? { actions: filmActions } : {})}
      />
    );
  }
  if (input.kind === 'tolerance' && result.kind === 'tolerance') {
    return <ToleranceResultView input={input} result={result} view={view} onView={onView} />;
  }
  return <p role="alert">The stored answer does not belong to this question. Run it again.</p>;
}
