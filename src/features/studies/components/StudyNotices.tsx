import { useQuery } from '@tanstack/react-query';
import type { Study } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { NotSavedNotice, RestoredNotice, SaveNotice } from '../../../components/SaveNotices.tsx';
import { studyVersionsQuery } from '../api/study.ts';
import type { StudyEditor } from '../hooks/useStudyEditor.ts';

/** What stands between the edits and the server: a restored draft, a version of somebody else, a failed save. */
export function StudyNotices({ editor }: { editor: StudyEditor }) {
  const { conflict, saveError, restored } = editor;
  if (conflict) {
    const { study, since } = conflict;
    return (
      <SaveNotice tone="warn">
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
      </SaveNotice>
    );
  }
  if (saveError) return <NotSavedNotice message={saveError.message} issues={editor.saveIssues} />;
  if (restored) return <RestoredNotice onDiscard={editor.takeSaved} onKeep={editor.dismissRestored} />;
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
