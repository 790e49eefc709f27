import { formatCount, formatPlain, formatTypedComplex } from '../../../lib/format.ts';
import type { IndexDispersion } from '../../../../shared/dispersion.ts';

/** Tensors on screen at most. */
const MOST_TENSORS = 40;
const letters = ['x', 'y', 'z'] as const;

/** Free permittivity tensors, row by row. */
export function TensorTable({ wavelengthsNm, epsilon }: Extract<IndexDispersion, { kind: 'tensor' }>) {
  const count = wavelengthsNm.length;
  return (
    <div className="flex flex-col gap-2">
      <p>
        A free permittivity tensor{' '}
        {count === 1 ? 'known at one wavelength' : `at ${formatCount(count)} wavelengths`}. It carries its own
        magnetization: reversing that transposes it. The plot shows the square root of a third of its trace.
      </p>
      <div tabIndex={0} role="region" aria-label="Tensors" className="max-h-80 overflow-auto">
        {wavelengthsNm.slice(0, MOST_TENSORS).map((wavelength, position) => (
          <table key={position} className="mb-2 text-note">
            <caption className="text-left text-muted">{formatPlain(wavelength)} nm</caption>
            <tbody>
              {epsilon[position]?.map((row, y) => (
                <tr key={letters[y]}>
                  {row.map((value, x) => (
                    <td
                      key={letters[x]}
                      title={`ε_${letters[y]}${letters[x]}`}
                      className="py-0.5 pr-5 whitespace-nowrap"
                    >
                      {formatTypedComplex(value)}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        ))}
        {count > MOST_TENSORS ? (
          <p className="text-note text-muted">
            The first {MOST_TENSORS} of {formatCount(count)}. Export CSV gives all of them.
          </p>
        ) : null}
      </div>
    </div>
  );
}
