import type { ReactNode } from 'react';
import type { MaterialContent } from '../../../../shared/material.ts';
import { StoredAnisotropy } from './StoredAnisotropy.tsx';
import { StoredIndex } from './StoredIndex.tsx';
import { StoredVoigt } from './StoredVoigt.tsx';
import { ThermalNote } from './ThermalNote.tsx';

/** Everything that a version holds, as it is stored: this is what a solve reads. */
export function StoredContent({ content }: { content: MaterialContent }) {
  const { index, voigt, anisotropy, thermal } = content;
  return (
    <div className="flex flex-col gap-4">
      <Part title="Index N = n + ik">
        <StoredIndex index={index} />
      </Part>
      {anisotropy ? (
        <Part title="Crystal axes">
          <StoredAnisotropy anisotropy={anisotropy} />
        </Part>
      ) : null}
      <Part title="Voigt constant Q">
        {voigt ? <StoredVoigt voigt={voigt} /> : <p className="text-muted">None is known here.</p>}
      </Part>
      {thermal ? (
        <Part title="Magnetization against temperature">
          <ThermalNote law={thermal} />
        </Part>
      ) : null}
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div>
      <h3 className="mb-1 text-note text-muted">{title}</h3>
      {children}
    </div>
  );
}
