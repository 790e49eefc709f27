import { useEffect, useState } from 'react';
import { Button } from '../../../components/Button.tsx';

/** A fit does not know beforehand how many steps it takes; so it says for how long it has run. */
export function FitRunning({ onCancel }: { onCancel: () => void }) {
  const [seconds, setSeconds] = useState(0);
  useEffect(() => {
    const timer = setInterval(() => setSeconds((now) => now + 1), 1000);
    return () => clearInterval(timer);
  }, []);
  return (
    <div className="flex flex-wrap items-center gap-3">
      <div
        role="progressbar"
        aria-label="Fitting"
        className="h-1.5 w-40 overflow-hidden rounded-full bg-line"
      >
        <div className="h-full w-1/3 animate-pulse rounded-full bg-accent" />
      </div>
      <span className="text-note text-muted">Fitting for {seconds} s; it stops by itself after 60 s</span>
      <Button tone="plain" className="py-1!" onClick={onCancel}>
        Cancel
      </Button>
    </div>
  );
}
