import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, over, plus, squareRoot, times } from '../optics/complexNumber.ts';
import {
  arcTangent,
  cosine,
  exponential,
  hyperbolicCosine,
  hyperbolicSine,
  hyperbolicTangent,
  logarithm,
  power,
  sine,
  tangent,
} from './complexFunctions.ts';

/** The functions that a formula may use, each of one argument. */
export const formulaFunctions = [
  'sqrt',
  'exp',
  'log',
  'sin',
  'cos',
  'tan',
  'atan',
  'sinh',
  'cosh',
  'tanh',
  'abs',
  're',
  'im',
  'conj',
] as const;

export const formulaOperators = [
  'add',
  'subtract',
  'multiply',
  'divide',
  'pow',
  'unaryMinus',
  'unaryPlus',
] as const;

/** Numbers of one kind with the operations of a formula; a unary operator is given 0 as its second operand. */
export type FormulaAlgebra<Value> = {
  fromNumber: (value: number) => Value;
  operators: Record<(typeof formulaOperators)[number], (a: Value, b: Value) => Value>;
  functions: Record<(typeof formulaFunctions)[number], (a: Value) => Value>;
};

/** Real numbers: what has no real value is NaN. */
export const realAlgebra: FormulaAlgebra<number> = {
  fromNumber: (value) => value,
  operators: {
    add: (a, b) => a + b,
    subtract: (a, b) => a - b,
    multiply: (a, b) => a * b,
    divide: (a, b) => a / b,
    pow: (a, b) => a ** b,
    unaryMinus: (a) => -a,
    unaryPlus: (a) => a,
  },
  functions: {
    sqrt: Math.sqrt,
    exp: Math.exp,
    log: Math.log,
    sin: Math.sin,
    cos: Math.cos,
    tan: Math.tan,
    atan: Math.atan,
    sinh: Math.sinh,
    cosh: Math.cosh,
    tanh: Math.tanh,
    abs: Math.abs,
    re: (a) => a,
    im: () => 0,
    conj: (a) => a,
  },
};

export const complexAlgebra: FormulaAlgebra<Complex> = {
  fromNumber: (value) => [value, 0],
  operators: {
    add: plus,
    subtract: minus,
    multiply: times,
    divide: over,
    pow: power,
    unaryMinus: ([re, im]) => [-re, 0 - im],
    unaryPlus: (a) => a,
  },
  functions: {
    sqrt: squareRoot,
    exp: exponential,
    log: logarithm,
    sin: sine,
    cos: cosine,
    tan: tangent,
    atan: arcTangent,
    sinh: hyperbolicSine,
    cosh: hyperbolicCosine,
    tanh: hyperbolicTangent,
    abs: (a) => [modulus(a), 0],
    re: (a) => [a[0], 0],
    im: (a) => [a[1], 0],
    conj: ([re, im]) => [re, 0 - im],
  },
};
