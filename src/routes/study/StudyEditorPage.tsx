import { useEffect } from 'react';
import { generatePath, useNavigate } from 'react-router-dom';
import { LIMITS } from '../../../shared/limits.ts';
import type { Study } from '../../../shared/study.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Field } from '../../components/Field.tsx';
import { Page } from '../../components/Page.tsx';
import { TextInput } from '../../components/TextInput.tsx';
import { controlLook } from '../../components/controlLook.ts';
import { MOST_RUNS } from '../../features/compare/model/comparedIds.ts';
import { SharePanel } from '../../features/sharing/components/SharePanel.tsx';
import { AddItem } from '../../features/studies/components/AddItem.tsx';
import { DecisionSection } from '../../features/studies/components/DecisionSection.tsx';
import { DeleteStudy } from '../../features/studies/components/DeleteStudy.tsx';
import { StudyItemList } from '../../features/studies/components/StudyItemList.tsx';
import { LeaveGuard } from '../../components/LeaveGuard.tsx';
import { StudyNotices } from '../../features/studies/components/StudyNotices.tsx';
import { StudyVersions } from '../../features/studies/components/StudyVersions.tsx';
import { useStudyEditor } from '../../features/studies/hooks/useStudyEditor.ts';
import { itemsOf } from '../../features/studies/model/rows.ts';
import type { StudyRow } from '../../features/studies/model/rows.ts';
import { paths } from '../../lib/paths.ts';
import { MemberItem } from './MemberItem.tsx';
import { StudyLine } from './StudyLine.tsx';
import { itemNames, useChoices } from './useChoices.ts';

/** A study for those who may change it. Nothing reaches the group before it is saved. */
export function StudyEditorPage({ study }: { study: Study }) {
  const editor = useStudyEditor(study);
  const { draft, dirty, saving, save } = editor;
  const { runs, designs } = useChoices(study.groupId);
  const navigate = useNavigate();
  useSaveKey(() => void save());
  const { groupId } = study;
  const empty = { title: draft.title.trim() === '', question: draft.question.trim() === '' };
  return (
    <Page
      title={draft.title || 'Study'}
      subtitle={<StudyLine study={study} />}
      actions={
        <>
          <span role="status" className="text-note text-muted">
            {saving ? 'Saving…' : dirty ? 'Not saved yet' : 'Saved'}
          </span>
          <CompareRunsOf groupId={groupId} rows={draft.rows} />
          <DeleteStudy
            study={study}
            onDeleted={() => void navigate(generatePath(paths.studies, { groupId }))}
          />
          <Button
            tone="primary"
            busy={saving}
            disabled={!dirty || empty.title || empty.question}
            onClick={() => void save()}
          >
            Save
          </Button>
        </>
      }
    >
      <StudyNotices editor={editor} />
      <LeaveGuard
        dirty={dirty}
        description="They are not in the group's study yet. This tab keeps them until you come back to the study or close it."
      />
      <div className="grid gap-x-8 gap-y-8 lg:grid-cols-[minmax(0,1fr)_340px]">
        <div className="flex min-w-0 flex-col gap-7">
          <div className="flex flex-col gap-3">
            <Field label="Title" error={empty.title ? 'must not be empty' : undefined}>
              {(control) => (
                <TextInput
                  {...control}
                  value={draft.title}
                  maxLength={LIMITS.nameLength}
                  onChange={(event) => editor.edit({ title: event.target.value })}
                />
              )}
            </Field>
            <Field label="Question" error={empty.question ? 'must not be empty' : undefined}>
              {(control) => (
                <textarea
                  {...control}
                  rows={2}
                  value={draft.question}
                  maxLength={LIMITS.noteLength}
                  onChange={(event) => editor.edit({ question: event.target.value })}
                  className={`${controlLook} field-sizing-content`}
                />
              )}
            </Field>
          </div>
          {draft.rows.length === 0 && (
            <EmptyState title="Nothing is in this study yet">
              Add a note, a run or a design below, or press “Pin to a study” on the page of a run to keep its
              plot as you see it there.
            </EmptyState>
          )}
          <StudyItemList
            rows={draft.rows}
            onRows={editor.editRows}
            renderPinned={(item) => <MemberItem item={item} />}
            nameOf={itemNames(runs, designs)}
          />
          <AddItem
            runs={runs}
            designs={designs}
            full={itemsOf(draft.rows).length >= LIMITS.studyItems}
            onAdd={(item) => editor.editRows((now) => [...now, { item, removed: false }])}
          />
          <DecisionSection
            decision={draft.decision}
            decided={study.decided}
            onChange={(decision) => editor.edit({ decision })}
          />
        </div>
        <aside className="flex min-w-0 flex-col gap-8">
          <SharePanel subject={{ opens: 'study', id: study.id }} />
          <StudyVersions studyId={study.id} version={study.version} />
        </aside>
      </div>
    </Page>
  );
}

/** Leads to the runs of the study over each other. */
function CompareRunsOf({ groupId, rows }: { groupId: string; rows: readonly StudyRow[] }) {
  const ids = itemsOf(rows).flatMap((item) => (item.kind === 'run' ? item.runId : []));
  const several = [...new Set(ids)].slice(0, MOST_RUNS);
  if (several.length < 2) return null;
  return (
    <ButtonLink to={`${generatePath(paths.compareRuns, { groupId })}?runs=${several.join(',')}`}>
      Compare its runs
    </ButtonLink>
  );
}

/** Ctrl S saves, as on the stack page. */
function useSaveKey(save: () => void) {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 's') return;
      event.preventDefault();
      save();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  });
}
