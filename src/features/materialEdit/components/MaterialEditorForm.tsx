import { useMemo } from 'react';
import type { PlainIndex, PlainVoigt } from '../../../../shared/dispersion.ts';
import type { Issue } from '../../../../shared/error.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { IssueContext } from '../hooks/issueContext.ts';
import type { MaterialEditor } from '../hooks/useMaterialEditor.ts';
import { usePreview } from '../hooks/usePreview.ts';
import { fitStart } from '../model/fitStart.ts';
import { plainIndexForm, plainVoigtForm } from '../model/formOfMaterial.ts';
import type { SourceForm } from '../model/form.ts';
import { withoutUntouched } from '../model/untouched.ts';
import { AnisotropySection } from './AnisotropySection.tsx';
import { EditorNotices } from './EditorNotices.tsx';
import { FitPanel } from './FitPanel.tsx';
import { IndexSection } from './IndexSection.tsx';
import { LeaveGuard } from './LeaveGuard.tsx';
import { NamingSection } from './NamingSection.tsx';
import { PreviewPanel } from './PreviewPanel.tsx';
import { SavePanel } from './SavePanel.tsx';
import { ThermalSection } from './ThermalSection.tsx';
import { VoigtSection } from './VoigtSection.tsx';

type Props = {
  editor: MaterialEditor;
  groupId: string;
  /** The shipped library and the group's own: parts of mixtures and data of fits. */
  materials: readonly MaterialSummary[];
  nextVersion: number | null;
};

/** The one form of a material, with its curves beside it. */
export function MaterialEditorForm({ editor, groupId, materials, nextVersion }: Props) {
  const { form, editContent, refusal } = editor;
  const { content } = form;
  const preview = usePreview(groupId, content);
  const marked = useMemo(() => withoutUntouched(preview.issues, content), [preview.issues, content]);
  const issues = useMemo<readonly Issue[]>(() => {
    if (!refusal) return marked;
    const said = new Set(refusal.issues.map(({ path, message }) => path + message));
    return [...refusal.issues, ...preview.issues.filter(({ path, message }) => !said.has(path + message))];
  }, [refusal, preview.issues, marked]);
  const starts = useMemo(() => fitStart(content), [content]);
  const useIndex = (fitted: PlainIndex | PlainVoigt, source: SourceForm) => {
    if (fitted.kind === 'model' || (fitted.kind === 'formula' && content.index.kind === 'formula')) {
      editContent({ index: plainIndexForm(fitted), indexSource: source });
    }
  };
  const useVoigt = (fitted: PlainIndex | PlainVoigt, source: SourceForm) => {
    if (fitted.kind === 'lines' || fitted.kind === 'formula') {
      editContent({ voigt: plainVoigtForm(fitted), voigtSource: source });
    }
  };
  return (
    <IssueContext value={issues}>
      <LeaveGuard dirty={editor.dirty} />
      <EditorNotices editor={editor} />
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)]">
        <div className="flex min-w-0 flex-col gap-4">
          <NamingSection form={form} onChange={editor.edit} />
          <IndexSection
            content={content}
            materials={materials}
            onChange={editContent}
            fit={
              starts.index ? (
                <FitPanel
                  key={content.index.kind}
                  target="index"
                  {...{ groupId, materials, start: starts.index, onUse: useIndex }}
                />
              ) : null
            }
          />
          <VoigtSection
            content={content}
            onChange={editContent}
            fit={
              starts.voigt ? (
                <FitPanel
                  key={content.voigt.kind}
                  target="voigt"
                  {...{ groupId, materials, start: starts.voigt, onUse: useVoigt }}
                />
              ) : null
            }
          />
          <AnisotropySection content={content} onChange={editContent} />
          <ThermalSection thermal={content.thermal} onChange={(thermal) => editContent({ thermal })} />
        </div>
        <div className="flex min-w-0 flex-col gap-4 lg:sticky lg:top-4">
          <PreviewPanel preview={preview} marked={marked.length} name={form.name.trim() || 'the material'} />
          <SavePanel editor={editor} nextVersion={nextVersion} />
        </div>
      </div>
    </IssueContext>
  );
}
