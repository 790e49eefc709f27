import { useQuery } from '@tanstack/react-query';
import { Pin } from 'lucide-react';
import { useState } from 'react';
import { Link, generatePath } from 'react-router-dom';
import { LIMITS } from '../../../../shared/limits.ts';
import type { Study, StudyItem } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { Dialog } from '../../../components/Dialog.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { paths } from '../../../lib/paths.ts';
import { usePinItem } from '../api/pinItem.ts';
import { studyListQuery } from '../api/studyList.ts';
import { newItemId } from '../model/rows.ts';

/** What is pinned: a run or a design as its page shows it now. */
type Pinned = { kind: 'run'; runId: string } | { kind: 'design'; designId: string };

type Props = {
  groupId: string;
  pinned: Pinned;
  /** The page's address after `?`: what is shown and how. */
  view: string;
  /** What the pinned thing is called. */
  name: string;
};

const NEW = 'new';

/** Appends what the page shows now to a study of the group, or starts a study with it. */
export function PinToStudy(props: Props) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button icon={<Pin aria-hidden="true" className="size-4" />} onClick={() => setOpen(true)}>
        Pin to a study
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Pin to a study"
        description="The study keeps the plot as it is now: its axes, readings, unit and marked value."
      >
        <PinForm {...props} onClose={() => setOpen(false)} />
      </Dialog>
    </>
  );
}

function PinForm({ groupId, pinned, view, name, onClose }: Props & { onClose: () => void }) {
  const studies = useQuery(studyListQuery(groupId));
  const [picked, setPicked] = useState<string | null>(null);
  const [title, setTitle] = useState('');
  const [question, setQuestion] = useState('');
  const [caption, setCaption] = useState('');
  const pin = usePinItem(groupId);
  const list = studies.data?.studies ?? [];
  const target = picked ?? list[0]?.id ?? NEW;
  if (pin.data) return <Done study={pin.data} name={name} onClose={onClose} />;
  if (studies.isPending) return <p className="text-muted">Loading the studies…</p>;
  const missing = target === NEW && (title.trim() === '' || question.trim() === '');
  const submit = () => {
    const common = { id: newItemId(), view: view.slice(0, 2_000), caption };
    const item: StudyItem = { ...common, ...pinned };
    pin.mutate({ target: target === NEW ? { title, question } : { studyId: target }, item });
  };
  return (
    <form
      noValidate
      aria-label="Pin to a study"
      className="flex flex-col gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (!missing && !pin.isPending) submit();
      }}
    >
      <Field label="Study">
        {(control) => (
          <Select
            {...control}
            value={target}
            options={[
              ...list.map((study) => ({ value: study.id, label: study.title })),
              { value: NEW, label: 'A new study' },
            ]}
            onValueChange={setPicked}
          />
        )}
      </Field>
      {target === NEW && (
        <>
          <Field label="Title of the new study">
            {(control) => (
              <TextInput
                {...control}
                value={title}
                maxLength={LIMITS.nameLength}
                onChange={(event) => setTitle(event.target.value)}
              />
            )}
          </Field>
          <Field label="Question it is to answer">
            {(control) => (
              <TextInput
                {...control}
                value={question}
                maxLength={LIMITS.noteLength}
                onChange={(event) => setQuestion(event.target.value)}
              />
            )}
          </Field>
        </>
      )}
      <Field label="Caption" hint="What the plot shows, in a sentence; it can be written later.">
        {(control) => (
          <TextInput
            {...control}
            value={caption}
            maxLength={LIMITS.noteLength}
            onChange={(event) => setCaption(event.target.value)}
          />
        )}
      </Field>
      <FormError message={pin.error?.message ?? studies.error?.message} />
      <div className="flex justify-end gap-2">
        <Button onClick={onClose}>Cancel</Button>
        <Button
          type="submit"
          tone="primary"
          busy={pin.isPending}
          disabled={missing}
          title={missing ? 'A new study needs a title and a question' : undefined}
        >
          Pin
        </Button>
      </div>
    </form>
  );
}

function Done({ study, name, onClose }: { study: Study; name: string; onClose: () => void }) {
  return (
    <>
      <p role="status">
        {name} stands at the end of{' '}
        <Link className="prose-link" to={generatePath(paths.study, { studyId: study.id })}>
          {study.title}
        </Link>
        .
      </p>
      <div className="flex justify-end">
        <Button onClick={onClose}>Close</Button>
      </div>
    </>
  );
}
