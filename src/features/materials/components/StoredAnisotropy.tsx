import type { Anisotropy } from '../../../../shared/dispersion.ts';
import { formatPlain, formatTypedComplex } from '../../../lib/format.ts';
import { Law } from './Law.tsx';
import { StoredIndex } from './StoredIndex.tsx';

/** What makes the crystal more than N and Q. */
export function StoredAnisotropy({ anisotropy }: { anisotropy: Anisotropy }) {
  if (anisotropy.kind === 'uniaxial') {
    return (
      <div className="flex flex-col gap-2">
        <p>
          Uniaxial, with the optic axis along ({anisotropy.axis.map(formatPlain).join(', ')}). The index above
          is the ordinary one; the extraordinary index is stored as follows.
        </p>
        <StoredIndex index={anisotropy.extraordinary} />
      </div>
    );
  }
  const { wavelengthNm, g11, g12, g44, azimuthDeg } = anisotropy;
  return (
    <Law
      law={`Cubic crystal with a permittivity of second order in m, known at ${formatPlain(wavelengthNm)} nm.`}
      parameters={[
        { name: 'g₁₁', value: formatTypedComplex(g11) },
        { name: 'g₁₂', value: formatTypedComplex(g12) },
        { name: 'g₄₄', value: formatTypedComplex(g44) },
        { name: '[100] from x toward y', value: `${formatPlain(azimuthDeg)}°` },
      ]}
    />
  );
}
