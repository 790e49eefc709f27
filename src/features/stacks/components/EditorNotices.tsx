import type { ReactNode } from 'react';
import type { Stack } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
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
      <Notice tone="warn">
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
          <Button className="py-1!" tone="plain" onClick={editor.takeNewest}>
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

function Notice({ tone, children }: { tone: 'warn' | 'danger'; children: ReactNode }) {
  const look = tone === 'warn' ? 'bg-warn-soft text-ink' : 'bg-danger-soft text-danger';
  return (
    <div role="alert" className={`mt-2 flex flex-col gap-2 rounded-control px-3 py-2 text-note ${look}`}>
      {children}
    </div>
  );
}
