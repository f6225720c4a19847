import { goalConditions, goalWords } from '../description/phrase/goalQuantities';
import type { DescriptionSyntax } from '../description/syntax';
import { unitOffers, unitsOf, type UnitKind } from './completeUnit';
import { nothingToOffer, offer, type Offer, type Offers } from './completionItem';

/** What may come next in a goal of which `phrase` stands there. */
export function goalOffers(syntax: DescriptionSyntax, phrase: string): Offers {
  const named = clauseOffers(syntax, phrase);
  if (named) return named;
  const word = goalWords.find(({ quantity }) => phrase.startsWith(`${quantity} `));
  if (!word) return /[<>=≥≤]/.test(phrase) ? nothingToOffer : { offers: quantityOffers(syntax), before: phrase.length };
  const rest = phrase.slice(word.quantity.length + 1).trimStart();
  if (word.ofElement && /^[\p{L}\d_.-]*$/u.test(rest)) return { offers: elementOffers(syntax), before: rest.length };
  const compared = /(?:>=|<=|≥|≤|>|<)\s*(.*)$/u.exec(rest);
  if (!compared) {
    const other = word.usual === '>=' ? '<=' : '>=';
    return { offers: [offer(word.usual, 'usual for this'), offer(other, '')], before: word.ofElement ? /\S*$/.exec(rest)![0].length : rest.length };
  }
  const limit = compared[1];
  const kinds = word.kinds.filter((kind): kind is UnitKind => kind in unitsOf);
  const units = unitOffers(limit, kinds);
  const isBegun = /^[-−+]?[\d.]+[ \u00a0]?[\p{L}°%]{0,3}$/u.test(limit);
  if (isBegun && units.offers.length > 0 && !kinds.some((kind) => unitsOf[kind].some((unit) => limit.endsWith(unit)))) return units;
  return /\s\p{L}*$/u.test(limit) ? { offers: clauseWords(word.quantity), before: /\p{L}*$/u.exec(limit)![0].length } : nothingToOffer;
}

function quantityOffers(syntax: DescriptionSyntax): Offer[] {
  const band = syntax.bands[0]?.name.value;
  // The examples speak of a band that this description need not have.
  const fitted = (example: string) => (band === undefined ? example.replace(/ at 2 x uplink/, '') : example.replace('uplink', band));
  return [
    ...goalWords.map(({ quantity, example }) => offer(quantity, fitted(example), { insertText: fitted(example) })),
    ...goalConditions.map((condition) => offer(condition, 'condition')),
  ];
}

const clauseWords = (quantity: string): Offer[] => [
  offer('in', 'a band or a range'), offer('at', 'a frequency, or 2 x a band'), offer('for', 'one load case'), offer('into', 'another load'),
  ...(quantity === 'rejection' ? [offer('against', 'the band that it refers to')] : []),
];

/** After `in`, `at 2 x`, `against`, `for`: names of the description. */
function clauseOffers(syntax: DescriptionSyntax, phrase: string): Offers | null {
  const band = /\s(?:in|against|\d+\s*[x×])\s+([\p{L}][\p{L}\d _-]*|)$/u.exec(phrase);
  if (band && !/\s(?:for|into|at|in|against)\s/.test(` ${band[1]}`)) return { offers: bandOffers(syntax), before: band[1].length };
  const cased = /\sfor\s+([\p{L}][\p{L}\d _-]*|)$/u.exec(phrase);
  if (cased && !/\s(?:into|at|in|against)\s/.test(` ${cased[1]}`)) return { offers: caseOffers(syntax), before: cased[1].length };
  return null;
}

export const bandOffers = ({ bands }: DescriptionSyntax): Offer[] => bands.map(({ name }) => offer(name.value, 'band'));
export const caseOffers = ({ load }: DescriptionSyntax): Offer[] => (load?.cases ?? []).flatMap(({ name }) => (name ? [offer(name.value, 'load case')] : []));
const elementOffers = ({ ladder }: DescriptionSyntax): Offer[] => [...(ladder?.elements ?? []).map(({ name, keyword }) => offer(name.value, keyword)), offer('load', 'the load')];
