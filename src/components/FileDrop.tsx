import { Upload } from 'lucide-react';
import { useId, useState } from 'react';
import type { DragEvent, ReactNode } from 'react';

type FileDropProps = {
  /** What is asked for, such as "Choose a table". */
  label: string;
  /** What is accepted and how large it may be, said before anything is sent. */
  hint: ReactNode;
  /** Endings and types that the file dialog offers first. */
  accept: string;
  disabled?: boolean;
  onFile: (file: File) => void;
};

/** One file, chosen in the dialog of the system or dropped here. The keyboard reaches it as a file field. */
export function FileDrop({ label, hint, accept, disabled = false, onFile }: FileDropProps) {
  const id = useId();
  const [over, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    const [file] = event.dataTransfer.files;
    if (file && !disabled) onFile(file);
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(!disabled);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={`relative flex flex-col items-center gap-1.5 rounded-card border border-dashed px-5 py-7 text-center has-[:focus-visible]:outline-2 has-[:focus-visible]:outline-accent ${over ? 'border-accent bg-accent-soft' : 'border-edge bg-panel'}`}
    >
      <Upload aria-hidden="true" className="size-5 text-muted" />
      <label htmlFor={id} className="font-semibold text-accent">
        {label}
        {/* The field lies over the whole area, so that a press anywhere opens the dialog. */}
        <input
          id={id}
          type="file"
          accept={accept}
          disabled={disabled}
          aria-describedby={`${id}-hint`}
          className="absolute inset-0 cursor-pointer opacity-0 disabled:cursor-not-allowed"
          onChange={(event) => {
            const [file] = event.target.files ?? [];
            if (file) onFile(file);
            // The same file, mended, can be chosen again.
            event.target.value = '';
          }}
        />
      </label>
      <span className="text-muted">{over ? 'Let go to send it' : 'or drop it here'}</span>
      <div id={`${id}-hint`} className="max-w-prose text-note text-muted">
        {hint}
      </div>
    </div>
  );
}
