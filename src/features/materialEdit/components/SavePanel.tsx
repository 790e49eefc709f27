import { Button } from '../../../components/Button.tsx';
import { FormError } from '../../../components/Field.tsx';
import { LIMITS } from '../../../../shared/limits.ts';
import type { MaterialEditor } from '../hooks/useMaterialEditor.ts';
import { TextField } from './TextField.tsx';

type Props = {
  editor: MaterialEditor;
  /** The number of the version that would be made; null for a new material. */
  nextVersion: number | null;
};

/** The way into the library, with everything that keeps the form from it. */
export function SavePanel({ editor, nextVersion }: Props) {
  const { refusal, form, saving } = editor;
  const problems = refusal?.issues.map(({ path, message }) => `${path}: ${message}`) ?? [];
  return (
    <section aria-label="Save" className="card flex flex-col gap-3 px-4 py-3.5">
      {nextVersion === null ? null : (
        <TextField
          label="What changes, and why"
          path="note"
          value={form.versionNote}
          lines={2}
          maxLength={LIMITS.noteLength}
          hint="For those who read the history."
          onChange={(versionNote) => editor.edit({ versionNote })}
        />
      )}
      <FormError message={refusal ? [refusal.message, ...problems].join('\n') : undefined} />
      <div className="flex flex-wrap items-center gap-3">
        <Button tone="primary" busy={saving} disabled={!editor.canSave} onClick={() => void editor.save()}>
          {nextVersion === null ? 'Save material' : `Save as version ${nextVersion}`}
        </Button>
        <p role="status" className="text-note text-muted">
          {editor.dirty
            ? 'Unsaved changes'
            : nextVersion === null
              ? 'Nothing is stored yet'
              : 'Nothing is changed yet'}
        </p>
      </div>
      {nextVersion === null ? null : (
        <p className="text-note text-muted">
          A change of constants makes version {nextVersion}; a change of name, formula, class or notes alone
          makes none. Stacks and runs keep the version they have.
        </p>
      )}
    </section>
  );
}
