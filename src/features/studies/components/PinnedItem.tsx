import type { ReactNode } from 'react';
import { LIMITS } from '../../../../shared/limits.ts';
import type { StudyItem } from '../../../../shared/study.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';

type Props = {
  item: Exclude<StudyItem, { kind: 'note' }>;
  onCaption: ((caption: string) => void) | undefined;
  below: ReactNode;
  children: ReactNode;
};

/** A run or design as it was pinned, with what it shows in a sentence. */
export function PinnedItem({ item, onCaption, below, children }: Props) {
  return (
    <figure className="m-0">
      {children}
      {onCaption ? (
        <Field label="Caption" className="mt-2">
          {(control) => (
            <TextInput
              {...control}
              value={item.caption}
              maxLength={LIMITS.noteLength}
              placeholder="What it shows, in a sentence"
              onChange={(event) => onCaption(event.target.value)}
            />
          )}
        </Field>
      ) : (
        item.caption && <figcaption className="mt-2 max-w-prose">{item.caption}</figcaption>
      )}
      {below}
    </figure>
  );
}
