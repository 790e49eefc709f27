import { Redo2, Undo2 } from 'lucide-react';
import { Link, generatePath } from 'react-router-dom';
import type { Stack } from '../../../../shared/stack.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { countLayers } from '../../../../shared/stackCase.ts';
import { Button, IconButton } from '../../../components/Button.tsx';
import { formatCount, formatSince } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import type { StackEditor } from '../hooks/useStackEditor.ts';

type Props = { stack: Stack; editor: StackEditor; mayEdit: boolean };

/** Name of the stack, what of it is saved, undo and save. */
export function FilmHeader({ stack, editor, mayEdit }: Props) {
  const { draft, dirty, saving, version } = editor;
  const count = countLayers(draft.document.layers);
  const layers = `${formatCount(count)} ${count === 1 ? 'layer' : 'layers'}`;
  const state = saving ? 'saving' : dirty ? 'unsaved changes' : `saved ${formatSince(stack.updatedAt)}`;
  return (
    <header>
      {mayEdit ? (
        <h1 className="text-title">
          <input
            aria-label="Name of the stack"
            aria-invalid={draft.name.trim() === '' ? true : undefined}
            value={draft.name}
            maxLength={LIMITS.nameLength}
            onChange={(event) => editor.editDraft((now) => ({ ...now, name: event.target.value }), 'name')}
            className="-ml-1.5 w-full truncate rounded-box border-0 bg-transparent px-1.5 py-0 ring-1 ring-transparent outline-none hover:ring-edge focus:ring-2 focus:ring-accent"
          />
        </h1>
      ) : (
        <h1 className="text-title wrap-break-word">{draft.name}</h1>
      )}
      <div className="mt-0.5 flex min-h-8 items-center gap-1 text-note text-muted">
        <p role="status" className="min-w-0 flex-1">
          {layers}, version {version}
          {mayEdit ? `, ${state}.` : '. You may look, not change.'}
          {stack.isDemo && ' Demo.'}
        </p>
        {mayEdit && (
          <>
            <IconButton
              label="Undo (Ctrl+Z)"
              disabled={!editor.canUndo}
              onClick={editor.undo}
              className="size-7!"
            >
              <Undo2 size={15} aria-hidden />
            </IconButton>
            <IconButton
              label="Redo (Ctrl+Shift+Z)"
              disabled={!editor.canRedo}
              onClick={editor.redo}
              className="size-7!"
            >
              <Redo2 size={15} aria-hidden />
            </IconButton>
            <Button
              className="py-1!"
              disabled={!dirty}
              busy={saving}
              aria-keyshortcuts="Control+S Meta+S"
              title="Save (Ctrl+S)"
              onClick={() => void editor.save()}
            >
              Save
            </Button>
          </>
        )}
      </div>
      {mayEdit && (
        <Link
          className="prose-link text-note"
          to={`${generatePath(paths.newDesign, { groupId: stack.groupId })}?stack=${stack.id}`}
        >
          Choose its cap, optimise it or check its tolerances
        </Link>
      )}
    </header>
  );
}
