import { createRequire } from 'node:module';
import type * as mathjs from 'mathjs/number';
import type { ConstantNode, FunctionNode, MathNode, OperatorNode, ParenthesisNode, SymbolNode } from 'mathjs';
import { FORMULA_LENGTH } from '../../shared/dispersion.ts';
import type { FormulaAlgebra } from './formulaAlgebra.ts';
import { formulaFunctions, formulaOperators } from './formulaAlgebra.ts';
import { DispersionValueError } from './opticalValue.ts';

type Parse = (typeof mathjs)['parse'];

let mathjsParse: Parse | null = null;

/**
 * mathjs takes a second of a core to load, more than all the rest of a thread's code, and most threads never see a
 * formula: it is loaded with the first one.
 */
function loadParse(): Parse {
  if (mathjsParse) return mathjsParse;
  const loaded = createRequire(import.meta.url)('mathjs/number') as typeof mathjs;
  return (mathjsParse = loaded.parse);
}

/** A dispersion formula that cannot be used: not arithmetic, or without a real index at some wavelength. */
export class FormulaError extends DispersionValueError {
  override readonly name = 'FormulaError';
}

/** Wavelength in micrometres and photon energy in eV. */
export type FormulaVariables<Value> = { L: Value; E: Value };

export type FormulaEvaluator<Value> = (at: FormulaVariables<Value>) => Value;

/** Everything that arithmetic with names needs; strings, comments, lists, units and look-alikes fall outside. */
const otherCharacter = /[^0-9A-Za-z_.,+\-*/^() \t\r\n]/u;

/**
 * An expression as nested functions of L and E.
 *
 * @param constants the names that stand for a fixed value: coefficients and the imaginary unit
 * @param coefficientCount for the message that says which names are known
 * @throws FormulaError with what is not allowed and what is
 */
export function translateFormula<Value>(
  expression: string,
  algebra: FormulaAlgebra<Value>,
  constants: ReadonlyMap<string, Value>,
  coefficientCount: number,
): FormulaEvaluator<Value> {
  const names = namesOf(coefficientCount, constants.has('i'));
  const zero = algebra.fromNumber(0);
  return translate(parseFormula(expression, names));

  function translate(node: MathNode): FormulaEvaluator<Value> {
    if (isConstant(node)) {
      // mathjs reads Infinity, NaN and 1e999 as numbers too.
      if (typeof node.value === 'number' && Number.isFinite(node.value)) {
        const value = algebra.fromNumber(node.value);
        return () => value;
      }
    } else if (isSymbol(node)) {
      return translateName(node.name);
    } else if (isOperator(node)) {
      return translateOperator(node);
    } else if (isParenthesis(node)) {
      return translate(node.content);
    } else if (isFunction(node) && isSymbol(node.fn) && node.args.length === 1) {
      // `fn` is a symbol for sqrt(...), but a property access for anything.sqrt(...).
      const { name } = node.fn;
      const known = formulaFunctions.find((candidate) => candidate === name);
      if (known) {
        const [apply, argument] = [algebra.functions[known], translate(node.args[0]!)];
        return (at) => apply(argument(at));
      }
    }
    throw refusal(node.toString(), names);
  }

  function translateName(name: string): FormulaEvaluator<Value> {
    if (name === 'L') return ({ L }) => L;
    if (name === 'E') return ({ E }) => E;
    const value = constants.get(name);
    if (value !== undefined) return () => value;
    const remedy = name === 'i' ? `; i needs a complex quantity, N or eps` : '';
    throw new FormulaError(`${name} is not known here: use ${names}${remedy}`);
  }

  function translateOperator(node: OperatorNode): FormulaEvaluator<Value> {
    if (node.implicit) {
      // 1/2 L and 1/c1 L are read with different orders of operations; nobody should have to know.
      throw new FormulaError(`${node.toString()} needs a * between its factors`);
    }
    const known = formulaOperators.find((candidate) => candidate === node.fn);
    if (!known) throw refusal(node.toString(), names);
    const apply = algebra.operators[known];
    const [first, second] = node.args.map(translate);
    return second ? (at) => apply(first!(at), second(at)) : (at) => apply(first!(at), zero);
  }
}

function parseFormula(expression: string, names: string): MathNode {
  if (expression.length > FORMULA_LENGTH) {
    throw new FormulaError(
      `a formula may have ${FORMULA_LENGTH} characters at most, got ${expression.length}`,
    );
  }
  const other = otherCharacter.exec(expression);
  if (other) throw refusal(`the character ${other[0]}`, names);
  try {
    return loadParse()(expression);
  } catch (error) {
    if (error instanceof RangeError) throw new FormulaError('has too many parentheses inside one another');
    throw new FormulaError(
      `cannot be read as a formula: ${error instanceof Error ? error.message : String(error)}`,
    );
  }
}

function refusal(what: string, names: string): FormulaError {
  const functions = formulaFunctions.map((name) => `${name}()`).join(', ');
  return new FormulaError(
    `${what} is not allowed in a formula: use numbers, + - * / ^, parentheses, ${functions}, ${names}`,
  );
}

function namesOf(count: number, isComplex: boolean): string {
  const coefficients = count === 0 ? 'no coefficients' : count === 1 ? 'c1' : `c1 to c${count}`;
  return `L in um, E in eV${isComplex ? ', i' : ''} and ${coefficients}`;
}

const isConstant = (node: MathNode): node is ConstantNode => node.type === 'ConstantNode';
const isSymbol = (node: MathNode): node is SymbolNode => node.type === 'SymbolNode';
const isOperator = (node: MathNode): node is OperatorNode => node.type === 'OperatorNode';
const isParenthesis = (node: MathNode): node is ParenthesisNode => node.type === 'ParenthesisNode';
const isFunction = (node: MathNode): node is FunctionNode => node.type === 'FunctionNode';
