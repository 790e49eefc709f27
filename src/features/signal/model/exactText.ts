import type { ExactValues } from './exactValues.ts';

/** Exact values for other programs: every number reads back as the same double. */

export function exactJson({ wavelengthNm, angleDeg, amplitudes, numbers }: ExactValues): string {
  const plain = (name: string) => name.replace('−', '-');
  return JSON.stringify(
    {
      wavelengthNm,
      angleDeg,
      amplitudes: Object.fromEntries(
        amplitudes.map(({ name, re, im, modulus, phaseDeg }) => [plain(name), { re, im, modulus, phaseDeg }]),
      ),
      numbers: Object.fromEntries(numbers.map(({ name, unit, value }) => [plain(name), { value, unit }])),
    },
    null,
    2,
  );
}

/** Lines of an `align*` of amsmath. */
export function exactLatex({ wavelengthNm, angleDeg, amplitudes, numbers }: ExactValues): string {
  const lines = [
    ...amplitudes.map(
      ({ latex, re, im }) =>
        `${latex} &= ${latexNumber(re)} ${im < 0 || Object.is(im, -0) ? '-' : '+'} ${latexNumber(Math.abs(im))}\\,\\mathrm{i}`,
    ),
    ...numbers.map(
      ({ latex, unit, value }) =>
        `${latex} &= ${value === null ? '\\text{none}' : latexNumber(value) + (unit === 'deg' ? '{}^{\\circ}' : '')}`,
    ),
  ];
  return [
    `% ${wavelengthNm} nm, ${angleDeg} deg`,
    '\\begin{align*}',
    lines.map((line) => `  ${line}`).join(' \\\\\n'),
    '\\end{align*}',
  ].join('\n');
}

/** All digits that make the same double again, a power of ten set as one. */
export function latexNumber(value: number): string {
  const [mantissa = '0', exponent] = String(value).split('e');
  return exponent === undefined ? mantissa : `${mantissa} \\times 10^{${Number(exponent)}}`;
}
