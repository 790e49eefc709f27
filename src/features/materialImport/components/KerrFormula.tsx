import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';

/** Says that angles were turned into Q, and by what: physics of the conventions page, "From Kerr angles to Q". */
export function KerrFormula() {
  return (
    <div className="max-w-prose rounded-control bg-accent-soft px-3 py-2 text-note">
      <p>
        <strong className="font-semibold">Converted, not measured as Q:</strong> rotation and ellipticity
        became Q together with N by the exact formula of a thick sample at normal incidence, κ = i (ρ(Q) −
        ρ(−Q)) / (ρ(Q) + ρ(−Q)) with ρ(Q) = (N₀ − N√(1+Q)) / (N₀ + N√(1+Q)). A film thinner than light
        penetrates, or one under a cap, does not obey it.{' '}
        <Link to={`${paths.conventions}#kerr-tables`} className="prose-link">
          From Kerr angles to Q
        </Link>
      </p>
    </div>
  );
}
