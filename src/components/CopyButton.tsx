import { Check, Copy } from 'lucide-react';
import { useEffect, useState } from 'react';
import { Button } from './Button.tsx';

type CopyButtonProps = {
  /** What goes to the clipboard. */
  text: string;
  /** What it is, for screen readers: "token". */
  what: string;
  /** What the button says where several stand together. */
  label?: string;
};

/** Copies a text and says so. Where the browser forbids it, says to select and copy by hand. */
export function CopyButton({ text, what, label = 'Copy' }: CopyButtonProps) {
  const [state, setState] = useState<'ready' | 'copied' | 'refused'>('ready');
  useEffect(() => {
    if (state === 'ready') return undefined;
    const timer = setTimeout(() => setState('ready'), 3000);
    return () => clearTimeout(timer);
  }, [state]);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setState('copied');
    } catch {
      setState('refused');
    }
  };
  const Icon = state === 'copied' ? Check : Copy;
  return (
    <Button icon={<Icon aria-hidden="true" className="size-4" />} onClick={() => void copy()}>
      <span aria-live="polite">
        {state === 'copied' ? 'Copied' : state === 'refused' ? 'Select and copy by hand' : label}
        <span className="sr-only"> {what}</span>
      </span>
    </Button>
  );
}
