import { complex, evaluate, isComplex } from 'mathjs';
import type { Complex } from '../../shared/complex.ts';

/** A result of mathjs as a pair; a plain number is real. */
export function toPair(value: unknown): Complex {
  if (typeof value === 'number') return [value, 0];
  if (isComplex(value)) return [value.re, value.im];
  throw new TypeError(`not a complex number: ${String(value)}`);
}

/**
 * The value of a formula written as in a book, evaluated by mathjs: an evaluation that shares no line with the
 * solver. Steps are separated by line ends; the last one is the result.
 *
 * @param scope the letters of the formula; pairs stand for complex numbers
 */
export function formula(text: string, scope: Record<string, number | Complex>): Complex {
  const letters = new Map<string, unknown>(
    Object.entries(scope).map(([name, value]) => [
      name,
      typeof value === 'number' ? value : complex(value[0], value[1]),
    ]),
  );
  let result: unknown;
  for (const step of text.trim().split('\n')) result = evaluate(step, letters);
  return toPair(result);
}
