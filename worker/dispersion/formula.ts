import { parse } from 'mathjs/number';
import type { ConstantNode, FunctionNode, MathNode, OperatorNode, ParenthesisNode, SymbolNode } from 'mathjs';

/** A dispersion formula that cannot be used: not arithmetic, or without a real index at some wavelength. */
export class FormulaError extends Error {
  override readonly name = 'FormulaError';
}

/** Longer texts are refused before they are parsed. */
const longestExpression = 1_000;

const arithmetic = new Set(['add', 'subtract', 'multiply', 'divide', 'pow', 'unaryMinus', 'unaryPlus']);

/**
 * A formula as a function of the vacuum wavelength in nm; inside the expression L is in micrometres.
 *
 * Expressions reach us from people, so only numbers, + - * / ^, parentheses, sqrt(), L and the coefficients
 * c1 ... cN pass; everything else of the expression language is refused before anything is evaluated.
 *
 * @throws FormulaError on a refused expression, and from the function where n is not a positive real number
 */
export function compileFormula(
  expression: string,
  coefficients: readonly number[],
): (wavelengthNm: number) => number {
  const node = parseFormula(expression);
  refuseAllButArithmetic(node, coefficients.length);
  const compiled = node.compile();
  const scope = new Map(coefficients.map((value, position) => [`c${position + 1}`, value]));
  return (wavelengthNm) => {
    scope.set('L', wavelengthNm / 1000);
    const n: unknown = compiled.evaluate(scope);
    if (typeof n !== 'number' || !(n > 0 && n < Infinity)) {
      throw new FormulaError(
        `the formula ${expression} gives n = ${String(n)} at ${wavelengthNm} nm: n must be a real number > 0`,
      );
    }
    return n;
  };
}

function parseFormula(expression: string): MathNode {
  if (expression.length > longestExpression) {
    throw new FormulaError(
      `a formula may have ${longestExpression} characters at most, got ${expression.length}`,
    );
  }
  try {
    return parse(expression);
  } catch (error) {
    throw new FormulaError(
      `cannot be read as a formula: ${error instanceof Error ? error.message : String(error)}`,
    );
  }
}

function refuseAllButArithmetic(node: MathNode, coefficientCount: number): void {
  const visit = (child: MathNode) => refuseAllButArithmetic(child, coefficientCount);
  if (isConstant(node)) {
    if (typeof node.value === 'number') return;
  } else if (isSymbol(node)) {
    if (node.name === 'L' || isCoefficient(node.name, coefficientCount)) return;
    throw new FormulaError(`${node.name} is not known here: use L and ${namesOf(coefficientCount)}`);
  } else if (isOperator(node)) {
    if (arithmetic.has(node.fn)) return node.args.forEach(visit);
  } else if (isParenthesis(node)) {
    return visit(node.content);
  } else if (isFunction(node)) {
    // `fn` is a symbol for sqrt(...), but a property access for anything.sqrt(...).
    if (isSymbol(node.fn) && node.fn.name === 'sqrt' && node.args.length === 1) return visit(node.args[0]!);
  }
  throw new FormulaError(
    `${node.toString()} is not allowed in a formula: use numbers, + - * / ^, parentheses, sqrt(), L and ${namesOf(coefficientCount)}`,
  );
}

function isCoefficient(name: string, count: number): boolean {
  return /^c[1-9]\d{0,3}$/.test(name) && Number(name.slice(1)) <= count;
}

function namesOf(count: number): string {
  return count === 0 ? 'no coefficients' : count === 1 ? 'c1' : `c1 to c${count}`;
}

const isConstant = (node: MathNode): node is ConstantNode => node.type === 'ConstantNode';
const isSymbol = (node: MathNode): node is SymbolNode => node.type === 'SymbolNode';
const isOperator = (node: MathNode): node is OperatorNode => node.type === 'OperatorNode';
const isParenthesis = (node: MathNode): node is ParenthesisNode => node.type === 'ParenthesisNode';
const isFunction = (node: MathNode): node is FunctionNode => node.type === 'FunctionNode';
