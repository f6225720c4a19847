import type { Located } from '../../base/span';
import { dimensionVectors, plain, type DimensionVector } from '../../expression/dimensionVector';
import { expressionConstants, expressionFunctions } from '../../expression/evaluateExpression';
import { dimensionOf } from '../../quantity/unit';
import type { LetValue, Phrase, PhraseContext } from './phrase';
import { expressionAt } from './readExpression';
import { quantityAt, type QuantityKind } from './readQuantity';
import { complain, expectEnd, scanner, skipBlanks } from './scanner';

const kinds: readonly QuantityKind[] = ['resistance', 'inductance', 'capacitance', 'conductance', 'frequency', 'time', 'length', 'power', 'voltage', 'current', 'ratio', 'angle'];

/** A named value: a quantity, or `= …`. Null (reported) where name or value will not do. */
export function readLetPhrase(name: Located<string>, phrase: Phrase, context: PhraseContext): LetValue | null {
  const s = scanner(phrase, context);
  const wrong = nameProblem(name.value);
  if (wrong) complain(s, 'let-name', wrong, name.span);
  skipBlanks(s);
  const expression = expressionAt(s);
  if (expression !== undefined) {
    if (expression) expectEnd(s);
    return expression && !wrong ? { value: expression.value, dimension: expression.dimension } : null;
  }
  const found = quantityAt(s, kinds);
  if (!found) return null;
  expectEnd(s, 'arithmetic begins with «=»');
  if (wrong) return null;
  if (found.kind === 'angle') return { value: (Number(found.literal?.digits ?? found.value) * Math.PI) / 180, dimension: plain };
  const dimension: DimensionVector = Object.hasOwn(dimensionVectors, found.kind) ? dimensionVectors[found.kind as keyof typeof dimensionVectors] : plain;
  return { value: found.value, dimension };
}

const wordsOfExpressions = ['mod', 'to', 'and', 'or', 'xor', 'not', 'true', 'false', 'null', 'undefined', 'NaN', 'Infinity', 'end'];

function nameProblem(name: string): string | null {
  if (!/^[\p{L}_][\p{L}\d_]*$/u.test(name)) return `«${name}» cannot be a name in expressions: letters, digits and _, a letter first.`;
  if (/[µμΩ\u2126]/.test(name)) return `«${name}» cannot be a name in expressions: µ and Ω are letters of units.`;
  if (wordsOfExpressions.includes(name)) return `«${name}» is a word of expressions and cannot be a name.`;
  if (dimensionOf(name) !== null || ['dB', 'dBm'].includes(name)) return `«${name}» is a unit and cannot be a name.`;
  if (Object.hasOwn(expressionConstants, name)) return `«${name}» is a constant and cannot be a name.`;
  return expressionFunctions.includes(name) ? `«${name}» is a function and cannot be a name.` : null;
}
