import { generatePath } from 'react-router-dom';
import { Button } from '../../../components/Button.tsx';
import { paths } from '../../../lib/paths.ts';
import type { MaterialEditor } from '../hooks/useMaterialEditor.ts';

/** What stands between the edits and the library: a version of somebody else, or edits of before that are back. */
export function EditorNotices({ editor }: { editor: MaterialEditor }) {
  const { newer, restored, saving } = editor;
  if (newer) {
    const address = generatePath(paths.material, { materialId: newer.id });
    return (
      <div role="alert" className="mb-4 flex flex-col gap-2 rounded-control bg-warn-soft px-3 py-2">
        <p>
          {newer.author ?? 'Somebody'} made version {newer.version} of this material while you were editing
          version {editor.startedFrom}. Your edits are kept in this tab; choose what becomes of them.
        </p>
        <div className="flex flex-wrap items-center gap-1.5">
          <a href={address} target="_blank" rel="noreferrer" className="prose-link px-2">
            See version {newer.version} in a new tab
          </a>
          <Button className="py-1!" busy={saving} onClick={() => void editor.saveOnTop()}>
            Save mine as version {newer.version + 1}
          </Button>
          <Button className="py-1!" busy={saving} onClick={() => void editor.saveAsNew()}>
            Save mine as a new material
          </Button>
          <Button className="py-1!" tone="plain" onClick={editor.takeNewer}>
            Take theirs
          </Button>
        </div>
      </div>
    );
  }
  if (!restored) return null;
  return (
    <div
      role="alert"
      className="mb-4 flex flex-wrap items-center gap-1.5 rounded-control bg-warn-soft px-3 py-2"
    >
      <p className="flex-1">Your unsaved changes from before are back.</p>
      <Button className="py-1!" tone="plain" onClick={editor.discard}>
        Discard them
      </Button>
      <Button className="py-1!" tone="plain" onClick={editor.dismissRestored}>
        Keep
      </Button>
    </div>
  );
}
