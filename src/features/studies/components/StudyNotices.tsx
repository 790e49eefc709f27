import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Study } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { studyVersionsQuery } from '../api/study.ts';
import type { StudyEditor } from '../hooks/useStudyEditor.ts';

/** What stands between the edits and the server: a restored draft, a version of somebody else, a failed save. */
export function StudyNotices({ editor }: { editor: StudyEditor }) {
  const { conflict, saveError, restored } = editor;
  if (conflict) {
    const { study, since } = conflict;
    return (
      <Notice tone="warn">
        <p>
          {study.updatedBy ?? 'Somebody'} saved version {study.version} while you were editing. Your edits are
          kept in this tab.
        </p>
        <ChangesSince study={study} since={since} />
        <div className="flex flex-wrap gap-1.5">
          <Button className="py-1!" busy={editor.saving} onClick={() => void editor.saveOnTop()}>
            Save mine on top
          </Button>
          <Button className="py-1!" tone="plain" onClick={editor.takeSaved}>
            Take theirs
          </Button>
        </div>
      </Notice>
    );
  }
  if (saveError) {
    return (
      <Notice tone="danger">
        <p>
          Not saved: {saveError.message}
          {editor.saveIssues.map(({ path, message }) => (
            <span key={path + message} className="block">
              {path}: {message}
            </span>
          ))}
        </p>
      </Notice>
    );
  }
  if (restored) {
    return (
      <Notice tone="warn">
        <div className="flex flex-wrap items-center gap-1.5">
          <p className="flex-1">Your unsaved changes from before are back.</p>
          <Button className="py-1!" tone="plain" onClick={editor.takeSaved}>
            Discard them
          </Button>
          <Button className="py-1!" tone="plain" onClick={editor.dismissRestored}>
            Keep
          </Button>
        </div>
      </Notice>
    );
  }
  return null;
}

/** What the other saves changed, so that one can decide without losing either side. */
function ChangesSince({ study, since }: { study: Study; since: number }) {
  const versions = useQuery(studyVersionsQuery(study.id, study.version));
  const newer = (versions.data?.versions ?? []).filter(({ version }) => version > since);
  if (newer.length === 0) return null;
  return (
    <ul className="list-disc pl-5">
      {newer.flatMap(({ version, changes }) =>
        changes.map((change) => <li key={`${version} ${change}`}>{change}</li>),
      )}
    </ul>
  );
}

function Notice({ tone, children }: { tone: 'warn' | 'danger'; children: ReactNode }) {
  const look = tone === 'warn' ? 'bg-warn-soft text-ink' : 'bg-danger-soft text-danger';
  return (
    <div role="alert" className={`mb-4 flex flex-col gap-2 rounded-control px-3 py-2 text-note ${look}`}>
      {children}
    </div>
  );
}
