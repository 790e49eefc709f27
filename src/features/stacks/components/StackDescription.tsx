import { LIMITS } from '../../../../shared/limits.ts';

type Props = { text: string; onChange: ((text: string) => void) | null };

/** Notes on the whole film, such as where and when it was grown. */
export function StackDescription({ text, onChange }: Props) {
  if (!onChange) {
    return text ? <p className="mt-4 ml-[38px] text-note whitespace-pre-line text-muted">{text}</p> : null;
  }
  return (
    <textarea
      aria-label="Notes on the stack"
      placeholder="Notes on the stack"
      value={text}
      maxLength={LIMITS.noteLength}
      rows={2}
      onChange={(event) => onChange(event.target.value)}
      className="mt-4 ml-[30px] field-sizing-content w-[calc(100%-30px)] resize-none rounded-box bg-transparent px-2 py-1 text-note text-muted ring-1 ring-transparent outline-none hover:ring-edge focus:ring-2 focus:ring-accent"
    />
  );
}
