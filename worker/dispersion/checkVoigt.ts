import type { IndexDispersion, PlainVoigt } from '../../shared/dispersion.ts';
import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { checkColumns, checkRange, checkValues } from './checkColumns.ts';
import { isUsableVoigt, unusableVoigt } from './opticalValue.ts';
import { dispersionRangeNm, isEmptyRange, voigtRangeNm } from './range.ts';
import { sampleVoigt } from './sample.ts';

/** @param isIndexUsable the index has passed its own checks */
export function checkVoigt({ index, voigt }: MaterialContent, isIndexUsable: boolean): Issue[] {
  if (voigt === null) return [];
  if (index.kind === 'tensor') {
    const message = 'must be null beside a free tensor, which carries its own magnetization: put Q into it';
    return [{ path: 'voigt', message }];
  }
  if (voigt.kind !== 'mixture') return checkPlainVoigt('voigt', { index, voigt }, isIndexUsable);
  if (index.kind !== 'mixture' || index.parts.every((part) => part.voigt === null)) {
    const message =
      'a Q from the parts needs a mixed index with a magnetic part: give Q of its own or none beside these n and k, or make a material of its own from them';
    return [{ path: 'voigt', message }];
  }
  return isIndexUsable ? checkFollowing('voigt', { index, voigt }) : [];
}

/** A Q that stands by itself, of a material or of a part of a mixture. */
export function checkPlainVoigt(
  path: string,
  { index, voigt }: { index: IndexDispersion; voigt: PlainVoigt },
  isIndexUsable: boolean,
): Issue[] {
  switch (voigt.kind) {
    case 'table':
      return [
        ...checkColumns(path, voigt.wavelengthsNm, { q: voigt.q.length }),
        ...voigt.q.flatMap((q, i) =>
          isUsableVoigt(q) ? [] : [{ path: `${path}.q[${i}]`, message: unusableVoigt }],
        ),
      ];
    case 'formula': {
      const issues = checkRange(path, voigt.rangeNm);
      if (issues.length > 0) return issues;
      return checkValues(`${path}.expression`, voigt.rangeNm, (wavelengthsNm) =>
        sampleVoigt('it', { index, voigt }, wavelengthsNm),
      );
    }
    case 'lines': {
      const issues = checkRange(path, voigt.rangeNm);
      if (issues.length > 0 || (voigt.of === 'gyration' && !isIndexUsable)) return issues;
      return checkFollowing(path, { index, voigt });
    }
  }
}

/** A Q that may follow from the index: known somewhere, and with a value there. */
function checkFollowing(
  path: string,
  content: { index: IndexDispersion; voigt: NonNullable<MaterialContent['voigt']> },
): Issue[] {
  const rangeNm = voigtRangeNm(content)!;
  if (isEmptyRange(rangeNm)) {
    const message = `is known at no wavelength at which the index is (${dispersionRangeNm(content.index).join(' to ')} nm): it needs the index, so the ranges must overlap`;
    return [{ path, message }];
  }
  return checkValues(path, rangeNm, (wavelengthsNm) => sampleVoigt('it', content, wavelengthsNm));
}
