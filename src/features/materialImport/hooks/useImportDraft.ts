import { useCallback, useEffect, useState } from 'react';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { loadImportDraft, storeImportDraft } from '../model/importDraft.ts';
import type { ImportDraft } from '../model/importDraft.ts';

/** What was said about an import, kept in this tab over reloads until `forget` is called. */
export function useImportDraft(importId: string, table: ImportTable) {
  const [draft, setDraft] = useState(() => loadImportDraft(window.sessionStorage, importId, table));
  useEffect(() => storeImportDraft(window.sessionStorage, importId, draft), [importId, draft]);
  const change = useCallback(
    (part: Partial<ImportDraft>) => setDraft((before) => ({ ...before, ...part })),
    [],
  );
  const forget = () => storeImportDraft(window.sessionStorage, importId, null);
  return { draft, change, forget };
}
