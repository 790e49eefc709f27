import type { Complex } from '../../shared/complex.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import { forwardRoot, over, plus, times } from '../optics/complexNumber.ts';
import type { Mixed } from '../optics/mixture.ts';
import { bruggeman, maxwellGarnett } from '../optics/mixture.ts';

type Mixture = Pick<Extract<IndexDispersion, { kind: 'mixture' }>, 'model' | 'fraction'>;
type IndexColumns = { n: Float64Array; k: Float64Array };
type MixedPart = IndexColumns & { voigt: { re: Float64Array; im: Float64Array } | null };

/** N of a mixture from N of its parts, wavelength by wavelength (physics.md section 6). */
export function mixedIndex(mixture: Mixture, parts: readonly IndexColumns[]): IndexColumns {
  const count = parts[0]!.n.length;
  const [n, k] = [new Float64Array(count), new Float64Array(count)];
  for (let i = 0; i < count; i++) {
    const [re, im] = forwardRoot(mixAt(mixture, parts, i).permittivity);
    n[i] = re;
    // Lossless parts mix to a lossless medium but for rounding.
    k[i] = Math.max(im, 0);
  }
  return { n, k };
}

/** Q of a mixture whose parts are magnetized alike: the sum of what each part's gyration adds, over eps. */
export function mixedVoigt(
  mixture: Mixture,
  parts: readonly MixedPart[],
): { re: Float64Array; im: Float64Array } {
  const count = parts[0]!.n.length;
  const [re, im] = [new Float64Array(count), new Float64Array(count)];
  for (let i = 0; i < count; i++) {
    const mixed = mixAt(mixture, parts, i);
    let strength: Complex = [0, 0];
    parts.forEach((part, position) => {
      if (!part.voigt) return;
      const gyration = times([part.voigt.re[i]!, part.voigt.im[i]!], permittivityAt(part, i));
      strength = plus(strength, times(mixed.weights[position]!, gyration));
    });
    [re[i], im[i]] = over(strength, mixed.permittivity);
  }
  return { re, im };
}

function mixAt({ model, fraction }: Mixture, parts: readonly IndexColumns[], i: number): Mixed {
  const mix = model === 'bruggeman' ? bruggeman : maxwellGarnett;
  return mix(permittivityAt(parts[0]!, i), permittivityAt(parts[1]!, i), fraction);
}

function permittivityAt({ n, k }: IndexColumns, i: number): Complex {
  const index: Complex = [n[i]!, k[i]!];
  return times(index, index);
}
