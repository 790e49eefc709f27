import { LIMITS } from '../../../../shared/limits.ts';
import type { StudyItem } from '../../../../shared/study.ts';
import { Markdown } from './Markdown.tsx';
import { MarkdownField } from './MarkdownField.tsx';

type Note = Extract<StudyItem, { kind: 'note' }>;
type Props = { note: Note; onChange: ((note: Note) => void) | undefined };

export function NoteItem({ note, onChange }: Props) {
  if (!onChange) return <Markdown text={note.text} />;
  return (
    <MarkdownField
      label="Note"
      value={note.text}
      maxLength={LIMITS.studyNoteLength}
      onChange={(text) => onChange({ ...note, text })}
      hint="Markdown: **bold**, lists, [links](https://…)"
    />
  );
}
