import type { UsedMaterial } from '../../../../shared/run.ts';
import { formatFormula } from '../../../lib/format.ts';
import { SourceFacts } from './SourceFacts.tsx';

/** One material that went into a run: its version, the source of each constant, how a table was read. */
export function MaterialProvenance({ material }: { material: UsedMaterial }) {
  const { origin = [] } = material;
  return (
    <article aria-label={`${material.name}, version ${material.version}`}>
      <p>
        <b className="font-semibold">{formatFormula(material.formula)}</b>{' '}
        <span className="text-muted">
          {material.name}, version {material.version}
        </span>
      </p>
      <SourceFacts what="n, k" range={material.rangeNm} source={material.indexSource} />
      {material.voigtSource && material.voigtRangeNm && (
        <SourceFacts what="Q" range={material.voigtRangeNm} source={material.voigtSource} />
      )}
      {material.assumedConstant && (
        <p className="mt-1 text-note text-warn">
          A constant known at one wavelength was used at others too, as the person who made the run allowed.
        </p>
      )}
      {origin.length > 0 && (
        <details className="mt-1 text-note">
          <summary className="rounded-box">How the imported table was read</summary>
          <ul className="list-disc pl-5 text-muted">
            {origin.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </details>
      )}
    </article>
  );
}
