import { create, parseDependencies, type MathNode, type ParseFunction } from 'mathjs';
import { literalUnit } from './literalUnit';
import { combine, dimensionText, plain, raise, sameDimension, type DimensionVector } from './dimensionVector';
import { expressionLimits } from './limits';

/** A number in SI units with what it measures. */
export interface Measured {
  readonly value: number;
  readonly dimension: DimensionVector;
}

export type ExpressionResult = { readonly ok: true; readonly result: Measured } | { readonly ok: false; readonly message: string };

/** Names that an expression has of its own; a `let` may not take them. */
export const expressionConstants: Readonly<Record<string, number>> = { pi: Math.PI, e: Math.E };

const plainFunctions: Readonly<Record<string, (x: number) => number>> = {
  exp: Math.exp, log: Math.log, log10: Math.log10, log2: Math.log2, sin: Math.sin, cos: Math.cos, tan: Math.tan,
  asin: Math.asin, acos: Math.acos, atan: Math.atan, sinh: Math.sinh, cosh: Math.cosh, tanh: Math.tanh,
  // Of plain numbers only: what whole nanohenries are depends on the unit that one thinks in.
  round: Math.round, floor: Math.floor, ceil: Math.ceil,
};
const samePlaceFunctions: Readonly<Record<string, (...x: number[]) => number>> = {
  abs: Math.abs, min: Math.min, max: Math.max,
};

export const expressionFunctions: readonly string[] = [...Object.keys(plainFunctions), ...Object.keys(samePlaceFunctions), 'sqrt', 'cbrt', 'atan2'];

// Made at first use: loading all of mathjs at start-up would cost more than everything else together.
let parser: ParseFunction | null = null;

class Refusal extends Error {}

const onlyArithmetic = 'only numbers, units, names, + − * / ^, parentheses and functions may stand in an expression';

/**
 * Arithmetic on numbers with units and on names. mathjs parses; the tree is then walked with a list of what is allowed, so
 * nothing that it finds is ever run. Never throws, never takes long: text, nesting and nodes are bounded.
 */
export function evaluateExpression(text: string, names: ReadonlyMap<string, Measured>): ExpressionResult {
  if (text.trim() === '') return { ok: false, message: 'an expression follows «=»' };
  if (text.length > expressionLimits.characters) return { ok: false, message: `the expression is longer than ${expressionLimits.characters} characters` };
  if (nesting(text) > expressionLimits.depth) return { ok: false, message: 'the expression is nested too deeply' };
  if (/[;\n\r]/.test(text)) return { ok: false, message: 'an expression is one line of arithmetic' };
  let tree: MathNode;
  try {
    parser ??= create({ parseDependencies }).parse as ParseFunction;
    tree = parser(asciiUnits(text));
  } catch (error) {
    return { ok: false, message: `the expression cannot be read: ${(error as Error).message.replace(/\s*\(char.*\)$/, '').toLowerCase()}` };
  }
  const budget = { nodes: expressionLimits.nodes };
  try {
    const result = walk(tree, names, budget);
    if (!Number.isFinite(result.value)) return { ok: false, message: 'the expression has no finite value' };
    return { ok: true, result };
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, message: error.message };
    throw error;
  }
}

const asciiUnits = (text: string) => text.replace(/[Ω\u2126]/g, 'ohm').replace(/[µμ]/g, 'u').replace(/−/g, '-').replace(/[×·]/g, '*').replace(/π/g, 'pi').replace(/°/g, ' deg');

function nesting(text: string): number {
  let depth = 0;
  let deepest = 0;
  for (const character of text) {
    if (character === '(' || character === '[' || character === '{') deepest = Math.max(deepest, ++depth);
    else if (character === ')' || character === ']' || character === '}') depth--;
  }
  return deepest;
}

interface AnyNode {
  readonly type: string;
  readonly value?: unknown;
  readonly name?: string;
  readonly fn?: unknown;
  readonly op?: string;
  readonly implicit?: boolean;
  readonly args?: readonly MathNode[];
  readonly content?: MathNode;
}

function walk(tree: MathNode, names: ReadonlyMap<string, Measured>, budget: { nodes: number }): Measured {
  if (--budget.nodes < 0) throw new Refusal('the expression has too many terms');
  const node = tree as unknown as AnyNode;
  switch (node.type) {
    case 'ParenthesisNode': return walk(node.content!, names, budget);
    case 'ConstantNode':
      if (typeof node.value !== 'number') throw new Refusal(`«${String(node.value)}» is not a number`);
      return { value: node.value, dimension: plain };
    case 'SymbolNode': return named(node.name!, names);
    case 'OperatorNode': return operate(node, names, budget);
    case 'FunctionNode': return call(node, names, budget);
    default: throw new Refusal(onlyArithmetic);
  }
}

function named(name: string, names: ReadonlyMap<string, Measured>): Measured {
  const known = names.get(name);
  if (known) return known;
  if (Object.hasOwn(expressionConstants, name)) return { value: expressionConstants[name], dimension: plain };
  const unit = literalUnit(name);
  if (unit) return { value: unit.of('1'), dimension: unit.dimension };
  throw new Refusal(`there is no name or unit «${name}» here; names are defined by let, above their first use`);
}

function operate(node: AnyNode, names: ReadonlyMap<string, Measured>, budget: { nodes: number }): Measured {
  const [first, second] = node.args ?? [];
  const exact = node.op === '*' && node.implicit ? literalOf(first as unknown as AnyNode, second as unknown as AnyNode, names) : null;
  if (exact) return exact;
  const a = walk(first, names, budget);
  if (!second) {
    if (node.op === '-') return { value: -a.value, dimension: a.dimension };
    if (node.op === '+') return a;
    throw new Refusal(`«${node.op}» may not stand in an expression`);
  }
  const b = walk(second, names, budget);
  switch (node.op) {
    case '+':
    case '-':
      if (!sameDimension(a.dimension, b.dimension)) {
        throw new Refusal(`${dimensionText(a.dimension)} and ${dimensionText(b.dimension)} cannot be ${node.op === '+' ? 'added' : 'subtracted'}`);
      }
      return { value: node.op === '+' ? a.value + b.value : a.value - b.value, dimension: a.dimension };
    case '*': return { value: a.value * b.value, dimension: combine(a.dimension, b.dimension, 1) };
    case '/':
      if (b.value === 0) throw new Refusal('the expression divides by zero');
      return { value: a.value / b.value, dimension: combine(a.dimension, b.dimension, -1) };
    case '^':
      if (!sameDimension(b.dimension, plain)) throw new Refusal(`an exponent is a plain number, not ${dimensionText(b.dimension)}`);
      return { value: a.value ** b.value, dimension: raise(a.dimension, b.value) };
    default: throw new Refusal(`«${node.op}» may not stand in an expression`);
  }
}

/** `37 nH`: a constant and a unit, read as one literal so that not a bit of it is lost. */
function literalOf(first: AnyNode, second: AnyNode, names: ReadonlyMap<string, Measured>): Measured | null {
  if (first.type !== 'ConstantNode' || second.type !== 'SymbolNode' || typeof first.value !== 'number' || names.has(second.name!)) return null;
  const unit = literalUnit(second.name!);
  return unit && { value: unit.of(String(first.value)), dimension: unit.dimension };
}

function call(node: AnyNode, names: ReadonlyMap<string, Measured>, budget: { nodes: number }): Measured {
  const { type, name = '' } = node.fn as { type?: string; name?: string };
  if (type !== 'SymbolNode') throw new Refusal(onlyArithmetic);
  // Before its arguments are looked at, so that the message is about the call.
  if (!expressionFunctions.includes(name)) {
    throw new Refusal(names.has(name) ? `${name} is a value and not a function; write ${name} * (…)` : `there is no function «${name}» here; there are ${expressionFunctions.join(', ')}`);
  }
  const args = (node.args ?? []).map((argument) => walk(argument, names, budget));
  const wants = (count: number) => {
    if (args.length !== count) throw new Refusal(`${name} takes ${count === 1 ? 'one value' : `${count} values`}`);
  };
  if (name === 'sqrt' || name === 'cbrt') {
    wants(1);
    return { value: name === 'sqrt' ? Math.sqrt(args[0].value) : Math.cbrt(args[0].value), dimension: raise(args[0].dimension, name === 'sqrt' ? 1 / 2 : 1 / 3) };
  }
  if (Object.hasOwn(plainFunctions, name)) {
    wants(1);
    if (!sameDimension(args[0].dimension, plain)) throw new Refusal(`${name} takes a plain number, not ${dimensionText(args[0].dimension)}`);
    return { value: plainFunctions[name](args[0].value), dimension: plain };
  }
  if (name === 'min' || name === 'max') {
    if (args.length === 0) throw new Refusal(`${name} takes at least one value`);
  } else {
    wants(name === 'atan2' ? 2 : 1);
  }
  const other = args.find((argument) => !sameDimension(argument.dimension, args[0].dimension));
  if (other) throw new Refusal(`${name} takes values of one unit, not ${dimensionText(args[0].dimension)} and ${dimensionText(other.dimension)}`);
  if (name === 'atan2') return { value: Math.atan2(args[0].value, args[1].value), dimension: plain };
  return { value: samePlaceFunctions[name](...args.map((argument) => argument.value)), dimension: args[0].dimension };
}
