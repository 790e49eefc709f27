import { z } from 'zod';

/** A complex number as it travels in JSON: real and imaginary part. */
export type Complex = [re: number, im: number];

export const complexPairSchema = z.tuple([z.number(), z.number()], {
  error: 'must be a number or [re, im]',
});

/** `[re, im]`, or a plain number that stands for `[re, 0]`. */
export const complexSchema = z.union([z.number(), complexPairSchema], {
  error: 'must be a number or [re, im]',
});

export type ComplexInput = z.infer<typeof complexSchema>;

export function toComplex(value: ComplexInput): Complex {
  return typeof value === 'number' ? [value, 0] : [value[0], value[1]];
}

export const vectorSchema = z.tuple([z.number(), z.number(), z.number()], {
  error: 'must be three numbers',
});

export type Vector = [x: number, y: number, z: number];
