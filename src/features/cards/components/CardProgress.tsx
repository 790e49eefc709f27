import { useEffect, useRef } from 'react';
import { cardSteps } from '../../../../shared/growthCard.ts';
import type { CardMaking } from '../../../../shared/growthCard.ts';
import { Progress } from '../../../components/Progress.tsx';
import { formatCount } from '../../../lib/format.ts';

type Props = {
  progress: CardMaking['progress'];
  /** Films that will be drawn. */
  films: number;
  hasLink: boolean;
  onCancel: () => void;
};

/** How far the card is that somebody waits for, in the place of the button that was pressed. */
export function CardProgress({ progress, films, hasLink, onCancel }: Props) {
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => place.current?.focus(), []);
  const step = progress?.step ?? 'film';
  const words = {
    film: 'the film and its materials',
    bands: `readings and bands from ${formatCount(films)} films`,
    card: hasLink ? 'the card and its link' : 'the card',
  };
  return (
    <div
      ref={place}
      role="group"
      aria-label="Making the card"
      tabIndex={-1}
      className="card px-4 py-4 outline-none"
    >
      <Progress
        label={`Step ${cardSteps.indexOf(step) + 1} of ${cardSteps.length}: ${words[step]}`}
        done={progress?.done ?? 0}
        total={films}
        noun="films"
        secondsLeft={step === 'card' ? 0 : (progress?.secondsLeft ?? null)}
        onCancel={onCancel}
      />
      <p className="mt-2 text-note text-muted">
        Nothing is kept until the card is done: it ends when you cancel, leave or reload this page. What you
        filled in stays.
      </p>
    </div>
  );
}
