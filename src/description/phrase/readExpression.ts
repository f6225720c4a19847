import { dimensionText, dimensionVectors, plain, sameDimension, type DimensionVector } from '../../expression/dimensionVector';
import { evaluateExpression } from '../../expression/evaluateExpression';
import type { QuantityKind, ReadQuantity } from './readQuantity';
import { complain, spanOf, type Scanner } from './scanner';

/** An expression's extent in the phrase, with its value in SI units; null (reported) where it has none. */
export interface ReadExpression {
  readonly value: number;
  readonly dimension: DimensionVector;
  readonly start: number;
  readonly end: number;
}

/** Undefined where no `=` stands at the scanner. Goes on to the end of the phrase, or of the parentheses where more follows. */
export function expressionAt(s: Scanner): ReadExpression | null | undefined {
  if (s.text[s.at] !== '=') return undefined;
  const start = s.at;
  const end = expressionEnd(s.text, start + 1);
  s.at = end;
  const span = spanOf(s, start, end);
  if (!s.context.expressions) {
    complain(s, 'expression-refused', 'Expressions are not worked out in a workspace that is not trusted.', span);
    return null;
  }
  const outcome = evaluateExpression(s.text.slice(start + 1, end).trim(), s.context.lets);
  if (!outcome.ok) {
    complain(s, 'expression', `${outcome.message[0].toUpperCase()}${outcome.message.slice(1)}.`, span);
    return null;
  }
  return { ...outcome.result, start, end };
}

/** As a quantity of one of the kinds. */
export function readExpressionAt(s: Scanner, kinds: readonly QuantityKind[]): (ReadQuantity & { readonly kind: QuantityKind }) | null | undefined {
  const found = expressionAt(s);
  if (!found) return found;
  const span = spanOf(s, found.start, found.end);
  const kind = kinds.find((candidate) => sameDimension(vectorOf(candidate), found.dimension));
  if (!kind) {
    complain(s, 'unit-wrong', `This comes to ${dimensionText(found.dimension)}, but here ${kinds.map((candidate) => dimensionText(vectorOf(candidate))).join(' or ')} is wanted.`, span);
    return null;
  }
  // Expressions reckon angles in radians, phrases in degrees.
  return { value: kind === 'angle' ? (found.value * 180) / Math.PI : found.value, span, literal: null, kind };
}

const vectorOf = (kind: QuantityKind): DimensionVector =>
  Object.hasOwn(dimensionVectors, kind) ? dimensionVectors[kind as keyof typeof dimensionVectors] : plain;

/** Where an expression that begins behind its `=` ends. */
export function expressionEnd(text: string, from: number): number {
  const end = text.trimEnd().length;
  let at = from;
  while (at < end && text[at] === ' ') at++;
  if (text[at] !== '(') return end;
  let depth = 0;
  for (let i = at; i < end; i++) {
    if (text[i] === '(') depth++;
    else if (text[i] === ')' && --depth === 0) {
      // Only where figures follow do the parentheses end it: `(a + b) * c` and `(a) + (b)` go on.
      return figuresFollow.test(text.slice(i + 1, end)) ? i + 1 : end;
    }
  }
  return end;
}

const figuresFollow = /^\s*(?:±|\+\/-|[+\-−]\d[\d.]*\s*%|\|\||,|@|\.\.|(?:Q|ESR|ESL|SRF|rated|from|fixed|part|step|at|in|for|into|against|vf)\b|$)/;
