import { useEffect, useRef, useState } from 'react';
import { createDesignSchema } from '../../../../shared/design.ts';
import type { CreateDesign, Design, DesignInput } from '../../../../shared/design.ts';
import type { Issue } from '../../../../shared/error.ts';
import { describeIssues } from '../../../../shared/issues.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useCreateDesign } from '../api/createDesign.ts';
import { loadDraft, storeDraft } from '../model/keptDraft.ts';

type Subject = {
  groupId: string;
  stackId: string;
  start: DesignInput;
  /** Names what is filled in, so that it comes back to the same form after a reload. */
  keptUnder: string;
  onStarted: (design: Design) => void;
};

type Refusal = { message: string; issues: Issue[] };

/** A design question being filled in: kept over a reload, checked by the API's own rules when it is sent. */
export function useDesignForm({ groupId, stackId, start, keptUnder, onStarted }: Subject) {
  const [blank] = useState(() => ({ name: '', input: start }));
  const [kept] = useState(() => loadDraft(window.sessionStorage, keptUnder));
  const [draft, setDraft] = useState(kept ?? blank);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const create = useCreateDesign();
  // One key for what is filled in: pressing twice starts one design.
  const key = useRef({ of: draft, key: crypto.randomUUID() });
  const started = useRef(false);
  const dirty = draft !== blank;

  useEffect(() => {
    if (dirty && !started.current) storeDraft(window.sessionStorage, keptUnder, draft);
  }, [dirty, draft, keptUnder]);

  const edit = (change: Partial<typeof draft>) => {
    setRefusal(null);
    setDraft((now) => ({ ...now, ...change }));
  };
  const submit = () => {
    const name = draft.name.trim();
    const body: CreateDesign = { groupId, stackId, input: draft.input, ...(name === '' ? {} : { name }) };
    const parsed = createDesignSchema.safeParse(body);
    if (!parsed.success) {
      setRefusal({
        message: 'Not started yet. Please mend:',
        issues: describeIssues(parsed.error, body).map(belowInput),
      });
      return;
    }
    if (key.current.of !== draft) key.current = { of: draft, key: crypto.randomUUID() };
    create.mutate(
      { body, key: key.current.key },
      {
        onSuccess: (design) => {
          started.current = true;
          storeDraft(window.sessionStorage, keptUnder, null);
          onStarted(design);
        },
        onError: (error) => {
          key.current = { of: draft, key: crypto.randomUUID() };
          setRefusal({
            message: `Not started: ${error.message}`,
            issues: error instanceof ApiError ? error.issues.map(belowInput) : [],
          });
        },
      },
    );
  };
  return {
    draft,
    dirty,
    /** Whether the form came back from before a reload. */
    restored: kept !== null && dirty,
    refusal,
    busy: create.isPending || create.isSuccess,
    rename: (name: string) => edit({ name }),
    editInput: (input: DesignInput) => edit({ input }),
    submit,
    startAnew: () => {
      storeDraft(window.sessionStorage, keptUnder, null);
      setRefusal(null);
      setDraft(blank);
    },
  };
}

/** The form names its fields from the question on. */
function belowInput({ path, message }: Issue): Issue {
  return { path: path.replace(/^input\.?/, ''), message };
}
