import type { Span } from '../base/span';
import type { Description } from '../description/description';

export interface OutlineItem {
  readonly name: string;
  readonly detail: string;
  readonly kind: 'section' | 'band' | 'case' | 'load' | 'element' | 'goal' | 'family' | 'tunable' | 'let';
  readonly span: Span;
  readonly selectionSpan: Span;
  readonly children: readonly OutlineItem[];
}

/** The description as a tree of names, in the order of the text. */
export function outline({ syntax }: Description): OutlineItem[] {
  const { text } = syntax;
  const detailOf = (span: Span) => text.slice(span.start, span.end).replace(/\s+/g, ' ').trim();
  const leaf = (kind: OutlineItem['kind'], name: string, span: Span, selectionSpan: Span, detail: string): OutlineItem => ({ name, detail, kind, span, selectionSpan, children: [] });
  const named = (kind: OutlineItem['kind'], items: readonly { readonly name: { readonly value: string; readonly span: Span }; readonly span: Span }[]) =>
    items.map(({ name, span }) => leaf(kind, name.value, union(name.span, span), name.span, detailOf({ start: span.start <= name.span.start ? name.span.end : span.start, end: span.end }).replace(/^["']?\s*:\s*/, '')));
  const section = (name: string, children: readonly OutlineItem[]): OutlineItem[] => {
    if (children.length === 0) return [];
    const span = children.map((child) => child.span).reduce(union);
    return [{ name, detail: '', kind: 'section', span, selectionSpan: children[0].selectionSpan, children }];
  };
  const cases = syntax.load?.cases ?? [];
  return [
    ...section('bands', named('band', syntax.bands)),
    ...section('load', cases.map((each) => leaf(each.name ? 'case' : 'load', each.name?.value ?? 'load', each.name ? union(each.name.span, each.span) : each.span, each.name?.span ?? each.span, detailOf(each.impedance.span)))),
    ...section('fixture', elements(syntax.fixture, detailOf)),
    ...section('ladder', elements(syntax.ladder?.elements ?? [], detailOf)),
    ...section('parts', named('family', syntax.families)),
    ...section('tunables', named('tunable', syntax.tunables)),
    ...section('let', named('let', syntax.lets)),
    ...section('goals', syntax.goals.map((goal) => leaf('goal', goal.text, goal.span, goal.span, ''))),
  ].sort((a, b) => a.span.start - b.span.start);
}

function elements(entries: readonly { readonly keyword: string; readonly name: { readonly value: string; readonly span: Span }; readonly span: Span; readonly phrase: Span }[], detailOf: (span: Span) => string): OutlineItem[] {
  return entries.map(({ keyword, name, span, phrase }) => ({ name: name.value, detail: `${keyword}: ${detailOf(phrase)}`, kind: 'element', span, selectionSpan: name.span, children: [] }));
}

const union = (a: Span, b: Span): Span => ({ start: Math.min(a.start, b.start), end: Math.max(a.end, b.end) });
