import { useRef } from 'react';
import type { ReactNode } from 'react';
import { cardOrigin, cardTime, cardToleranceSentences } from '../../../../shared/cardWords.ts';
import type { GrowthCard } from '../../../../shared/growthCard.ts';
import { usePaperFit } from '../hooks/usePaperFit.ts';
import { CardLayerTable } from './CardLayerTable.tsx';
import { CardReadings } from './CardReadings.tsx';
import { QrCode } from './QrCode.tsx';

/** A card of the group or of a share link. */
type Props = { card: Omit<GrowthCard, 'groupId' | 'studyId' | 'designId'> };

/** The one page for the chamber, on screen and on A4 paper: the same words and numbers as its PDF. */
export function GrowthCardView({ card }: Props) {
  const { title, sampleId, layers, readings, bench, decision, assumptions, sources, cautions, url } = card;
  const paper = useRef<HTMLElement>(null);
  usePaperFit(paper, sampleId === '' ? title : `${title}, sample ${sampleId}`);
  return (
    <article
      ref={paper}
      aria-label={`Growth card ${title}`}
      className="card growth-card group mx-auto flex max-w-[820px] flex-col gap-4 px-5 py-5 sm:px-8"
    >
      <header className="flex items-start justify-between gap-4">
        <div className="min-w-0">
          <p className="text-small text-muted">Growth card</p>
          <h2 className="text-title wrap-break-word">{title}</h2>
          <p className="mt-1 text-note">
            Sample:{' '}
            {sampleId || (
              <span className="inline-block w-40 border-b border-dotted border-edge">
                <span className="sr-only">to fill in</span>&nbsp;
              </span>
            )}
          </p>
        </div>
        {url !== null && (
          <figure className="m-0 shrink-0 text-center">
            <QrCode text={url} label={`QR code of ${url}`} />
          </figure>
        )}
      </header>
      <CardLayerTable layers={layers} />
      <Part title="Predicted readings">
        <CardReadings readings={readings} />
      </Part>
      {bench && (
        <Part title="Bench">
          <p className="whitespace-pre-line">{bench}</p>
        </Part>
      )}
      <Part title="Decision">
        <p className="whitespace-pre-line">{decision.text}</p>
        <p className="text-muted">
          {decision.by}, {cardTime(decision.at)}
        </p>
      </Part>
      <Part title="Tolerances and assumptions">
        <Lines lines={[...cardToleranceSentences(card), ...assumptions]} runOn />
      </Part>
      {cautions.length > 0 && (
        <Part title="Cautions">
          <Lines lines={cautions} />
        </Part>
      )}
      <Part title="Sources">
        <Lines lines={sources} />
      </Part>
      <footer className="border-t border-line pt-2 text-small text-muted wrap-anywhere">
        <p>{cardOrigin(card)}</p>
        {url !== null && <p>{url}</p>}
      </footer>
    </article>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title} className="text-note">
      <h3 className="mb-1 text-[14px]">{title}</h3>
      {children}
    </section>
  );
}

/** @param props.runOn on paper that is short of room, one sentence after the other */
function Lines({ lines, runOn = false }: { lines: readonly string[]; runOn?: boolean }) {
  return (
    <ul className={`fine-print list-disc pl-4 wrap-break-word ${runOn ? 'run-on' : ''}`}>
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
