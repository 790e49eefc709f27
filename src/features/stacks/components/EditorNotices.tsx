import type { Stack } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { NotSavedNotice, RestoredNotice, SaveNotice } from '../../../components/SaveNotices.tsx';
import type { StackEditor } from '../hooks/useStackEditor.ts';

type Props = {
  editor: StackEditor;
  /** Whether the newer version is on the page instead of the edits. */
  showsNewer: boolean;
  onShowNewer: (shown: boolean) => void;
  onCopied: (stack: Stack) => void;
};

/** What stands between the edits and the server: a restored draft, a version of somebody else, a failed save. */
export function EditorNotices({ editor, showsNewer, onShowNewer, onCopied }: Props) {
  const { conflict, saveError, restored } = editor;
  const copy = () => {
    void editor.saveAsCopy(`${editor.draft.name.slice(0, 110)} (copy)`).then(onCopied, () => undefined);
  };
  if (conflict) {
    return (
      <SaveNotice tone="warn">
        <p>
          {conflict.updatedBy ?? 'Somebody'} saved version {conflict.version} while you were editing. Your
          edits are kept in this tab.
        </p>
        <div className="flex flex-wrap gap-1.5">
          <Button className="py-1!" onClick={() => onShowNewer(!showsNewer)}>
            {showsNewer ? 'Back to my edits' : `See version ${conflict.version}`}
          </Button>
          <Button className="py-1!" busy={editor.saving} onClick={() => void editor.saveOnTop()}>
            Save mine on top
          </Button>
          <Button className="py-1!" busy={editor.copying} onClick={copy}>
            Save mine as a copy
          </Button>
          <Button
            className="py-1!"
            tone="plain"
            onClick={() => {
              onShowNewer(false);
              editor.takeNewest();
            }}
          >
            Take theirs
          </Button>
        </div>
        {editor.copyError && <p className="text-danger">{editor.copyError.message}</p>}
      </SaveNotice>
    );
  }
  if (saveError) return <NotSavedNotice message={saveError.message} issues={editor.saveIssues} />;
  if (restored) return <RestoredNotice onDiscard={editor.takeNewest} onKeep={editor.dismissRestored} />;
  return null;
}
