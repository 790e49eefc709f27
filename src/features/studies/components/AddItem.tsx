import { Plus } from 'lucide-react';
import { useState } from 'react';
import type { StudyItem } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { newItemId } from '../model/rows.ts';

type Choice = { id: string; label: string };

type Props = {
  /** What can be added, newest first. */
  runs: readonly Choice[];
  designs: readonly Choice[];
  /** Whether the study holds as many items as it may. */
  full: boolean;
  onAdd: (item: StudyItem) => void;
};

/** Adds a note, or a run or design as its page shows it first. */
export function AddItem({ runs, designs, full, onAdd }: Props) {
  const [choosing, setChoosing] = useState<'run' | 'design' | null>(null);
  const add = (item: StudyItem) => {
    onAdd(item);
    setChoosing(null);
  };
  if (full) return <p className="text-muted">The study is full: remove something before you add more.</p>;
  const icon = <Plus aria-hidden="true" className="size-4" />;
  return (
    <section aria-label="Add to the study" className="flex flex-col gap-3">
      <div className="flex flex-wrap gap-2">
        <Button icon={icon} onClick={() => add({ kind: 'note', id: newItemId(), text: '' })}>
          Add note
        </Button>
        <Button
          icon={icon}
          aria-expanded={choosing === 'run'}
          onClick={() => setChoosing(choosing === 'run' ? null : 'run')}
        >
          Add run
        </Button>
        <Button
          icon={icon}
          aria-expanded={choosing === 'design'}
          onClick={() => setChoosing(choosing === 'design' ? null : 'design')}
        >
          Add design
        </Button>
      </div>
      {choosing === 'run' && (
        <Chooser
          key="run"
          what="Run"
          choices={runs}
          none="No run is done yet. Open a stack, sweep something and press “Keep as run”."
          onChoose={(runId) => add({ kind: 'run', id: newItemId(), runId, view: '', caption: '' })}
        />
      )}
      {choosing === 'design' && (
        <Chooser
          key="design"
          what="Design"
          choices={designs}
          none="No design is done yet. Start one on the designs page."
          onChoose={(designId) => add({ kind: 'design', id: newItemId(), designId, view: '', caption: '' })}
        />
      )}
    </section>
  );
}

type ChooserProps = {
  what: string;
  choices: readonly Choice[];
  none: string;
  onChoose: (id: string) => void;
};

function Chooser({ what, choices, none, onChoose }: ChooserProps) {
  const [chosen, setChosen] = useState(choices[0]?.id ?? '');
  if (choices.length === 0) return <p className="text-muted">{none}</p>;
  return (
    <div className="flex flex-wrap items-end gap-2">
      <Field label={what} className="min-w-0 max-w-full">
        {(control) => (
          <Select
            {...control}
            value={chosen}
            options={choices.map(({ id, label }) => ({ value: id, label }))}
            onValueChange={setChosen}
          />
        )}
      </Field>
      <Button onClick={() => onChoose(chosen)}>Add it</Button>
    </div>
  );
}
