import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useMemo, useRef, useState } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { Material } from '../../../../shared/material.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useCreateMaterial } from '../api/createMaterial.ts';
import { useRenameMaterial, useSaveVersion } from '../api/changeMaterial.ts';
import { materialVersionQuery } from '../api/materialVersion.ts';
import { fieldPath } from '../model/draftOfForm.ts';
import type { ContentForm, MaterialForm } from '../model/form.ts';
import { formOfMaterial } from '../model/formOfMaterial.ts';
import { loadForm, storeForm } from '../model/keptForm.ts';
import { readForm } from '../model/readForm.ts';
import { useKeptInTab } from '../../../lib/useKeptInTab.ts';

export type EditContent = (change: Partial<ContentForm>) => void;

type Subject = {
  groupId: string;
  /** What is edited, in its newest version; null for a material that is to be made. */
  material: Material | null;
  /** What the form holds before anything is edited. */
  start: MaterialForm;
  /** Names the edits of this tab, so that they come back to the right form. */
  keptUnder: string;
  onSaved: (material: Material) => void;
};

const same = (a: unknown, b: unknown) => a === b || JSON.stringify(a) === JSON.stringify(b);
const namesOf = ({ name, formula, class: materialClass, notes }: MaterialForm) => [
  name,
  formula,
  materialClass,
  notes,
];

/** A material being edited: what of it is saved, what is wrong with it, and what to do when somebody saved first. */
export function useMaterialEditor({ groupId, material, start, keptUnder, onSaved }: Subject) {
  const [kept] = useState(() => loadForm(window.sessionStorage, keptUnder));
  const [base, setBase] = useState(start);
  const [openedVersion] = useState(material?.version ?? null);
  const [form, setForm] = useState(kept?.form ?? start);
  const [startedFrom, setStartedFrom] = useState(kept?.baseVersion ?? openedVersion);
  const [restored, setRestored] = useState(kept !== null && !same(kept.form, start));
  const [newer, setNewer] = useState<Material | null>(
    material && kept?.baseVersion && kept.baseVersion < material.version ? material : null,
  );
  /** What was wrong at the last try to save, as long as nothing was changed since. */
  const [refusal, setRefusal] = useState<{ of: MaterialForm; message: string; issues: Issue[] } | null>(null);
  const [saving, setSaving] = useState(false);
  const underWay = useRef(false);
  const client = useQueryClient();
  const create = useCreateMaterial(groupId);
  const saveVersion = useSaveVersion(material?.id ?? '', groupId);
  const rename = useRenameMaterial(material?.id ?? '', groupId);

  const dirty = useMemo(() => !same(form, base), [form, base]);
  const unsaved = useMemo(
    () => (dirty ? { baseVersion: startedFrom, form } : null),
    [dirty, startedFrom, form],
  );
  useKeptInTab(storeForm, keptUnder, unsaved);

  const edit = useCallback((change: Partial<MaterialForm>) => setForm((now) => ({ ...now, ...change })), []);
  const editContent = useCallback<EditContent>(
    (change) => setForm((now) => ({ ...now, content: { ...now.content, ...change } })),
    [],
  );

  const finish = (saved: Material) => {
    storeForm(window.sessionStorage, keptUnder, null);
    setBase(form);
    setRestored(false);
    setNewer(null);
    onSaved(saved);
  };
  const store = async (over: number | null): Promise<void> => {
    const read = readForm(form);
    if (read.body === null) {
      return setRefusal({ of: form, message: 'Not saved yet. Please mend:', issues: read.issues });
    }
    const { versionNote: note, content, ...naming } = read.body;
    if (material === null || over === null) {
      return finish(await create.mutateAsync({ ...naming, content }));
    }
    let saved: Material = material;
    let stored = base;
    if (!same(form.content, base.content)) {
      saved = await saveVersion.mutateAsync({ version: over, note, content });
      // Should the new name be refused, the constants must not be saved a second time.
      stored = { ...stored, content: form.content };
      setBase(stored);
      setStartedFrom(saved.version);
    }
    if (!same(namesOf(form), namesOf(stored))) saved = await rename.mutateAsync(naming);
    finish(saved);
  };
  const save = async (over: number | null) => {
    // A second press before the first is answered would be a conflict with oneself.
    if (underWay.current) return;
    underWay.current = true;
    setSaving(true);
    setRefusal(null);
    try {
      await store(over);
    } catch (error) {
      if (material && error instanceof ApiError && error.status === 409) {
        // The refusal says that there is a newer version, not what is in it.
        setNewer(await client.fetchQuery({ ...materialVersionQuery(material.id, null), staleTime: 0 }));
      } else {
        setRefusal({ of: form, ...describe(error) });
      }
    } finally {
      underWay.current = false;
      setSaving(false);
    }
  };
  /** Puts what is stored now into the form and lets the edits go. */
  const takeStored = (stored: MaterialForm, version: number | null) => {
    setBase(stored);
    setForm(stored);
    setStartedFrom(version);
    setNewer(null);
    setRestored(false);
  };

  const shown = refusal?.of === form ? refusal : null;
  return {
    form,
    dirty,
    saving,
    /** A copy can be kept as it is; a version needs a change. */
    canSave: material === null || dirty,
    restored: restored && dirty,
    startedFrom,
    /** The newer version that somebody else made under these edits. */
    newer,
    refusal: shown,
    edit,
    editContent,
    save: () => save(startedFrom),
    saveOnTop: () => save(newer?.version ?? startedFrom),
    saveAsNew: () => save(null),
    takeNewer: () => newer && takeStored(formOfMaterial(newer), newer.version),
    discard: () => takeStored(base, openedVersion),
    dismissRestored: () => setRestored(false),
  };
}

function describe(error: unknown): { message: string; issues: Issue[] } {
  const issues = error instanceof ApiError ? error.issues : [];
  return {
    message: `Not saved: ${error instanceof Error ? error.message : 'the request failed. Try again.'}`,
    issues: issues.map(({ path, message }) => ({ path: fieldPath(path), message })),
  };
}

export type MaterialEditor = ReturnType<typeof useMaterialEditor>;
