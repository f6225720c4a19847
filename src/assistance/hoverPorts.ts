import type { Span } from '../base/span';
import type { FileReference } from '../description/files';
import type { CaseSyntax, SourceSyntax } from '../description/syntax';
import { divide, multiply, complex } from '../network/complex';
import { impedanceOf } from '../network/immittance';
import { printComplex, printPolar } from '../quantity/printComplex';
import { printQuantity } from '../quantity/printQuantity';
import { sampleSource } from '../study/sampleCase';
import { impedancePath } from '../study/impedancePath';
import type { Problem } from '../study/problem';
import type { Assessment } from './assess';
import { fileData } from './fileData';
import type { Hover } from './hover';
import { plainText } from './markdown';
import { defaultMarkerHz } from './markerView';

/** A load case: what the first band's middle sees of it, the fixture taken away. */
export function loadHover({ model: { problem } }: Assessment, { name, span, impedance }: CaseSyntax): Hover | null {
  const at = problem && defaultMarkerHz(problem);
  const index = problem?.cases.findIndex((candidate) => candidate.name === (name?.value ?? null)) ?? -1;
  if (!problem || at === null || index < 0) return null;
  const { load } = impedancePath(problem, index, at);
  const frequency = printQuantity(at, 'Hz', { digits: 5 });
  const lines = [load
    ? `**${plainText(name?.value ?? 'load')}** at ${frequency}: ${printComplex(multiply(complex(problem.z0Ohm), divide({ re: 1 + load.re, im: load.im }, { re: 1 - load.re, im: -load.im })), 'Ω')}, Γ ${printPolar(load)}`
    : `**${plainText(name?.value ?? 'load')}** is not known at ${frequency}.`];
  if (problem.cases[index].fixture.length > 0) lines.push('', 'The fixture has been taken away from the measurement.');
  if (impedance.form === 'complex' && !impedance.atHz) lines.push('', 'The same at every frequency, which real loads are not: with «at 868 MHz» it becomes a resistance in series with the coil or capacitor that has this reactance there.');
  return { span, markdown: lines.join('\n') };
}

/** The source: whose impedance was taken, where it has a reactance. */
export function sourceHover({ model: { problem } }: Assessment, { wants, span, band }: SourceSyntax): Hover | null {
  const at = problem && defaultMarkerHz(problem);
  if (!problem || at === null) return null;
  const index = band ? problem.bands.findIndex((candidate) => candidate.name === band.value) : -1;
  const frequencyHz = index < 0 ? at : Math.sqrt(problem.bands[index].frequencyHz[0] * problem.bands[index].frequencyHz[problem.bands[index].frequencyHz.length - 1]);
  const z = impedanceOf(sampleSource(problem.source, problem.bands, Float64Array.of(frequencyHz), index < 0 ? null : problem.bands[index].name));
  const own = { re: z.re[0], im: z.im[0] };
  const frequency = printQuantity(frequencyHz, 'Hz', { digits: 5 });
  const conjugate = printComplex({ re: own.re, im: -own.im }, 'Ω');
  const markdown = own.im === 0 ? `The port's own impedance: ${printComplex(own, 'Ω')} at ${frequency}.`
    : wants ? `Read as the load that the port should see, ${conjugate} at ${frequency}; the port itself is its conjugate, ${printComplex(own, 'Ω')}.`
      : `Read as the port's own impedance, ${printComplex(own, 'Ω')} at ${frequency}; it wants to see ${conjugate}. Data sheets that print the wanted load are written «wants …».`;
  return { span, markdown };
}

/** A file: its points, span and ports; of a drawer or a pattern, the parts that came of it. */
export function fileHover({ description: { syntax }, model: { problem } }: Assessment, { path, span, kind }: FileReference): Hover {
  const head = `\`${path.replace(/`/g, '')}\``;
  const family = syntax.families.find(({ source }) => (source.form === 'csv' && source.path.value === path) || (source.form === 'files' && source.pattern.value === path));
  const parts = kind !== 'touchstone' && family ? familyText(problem, family.name.value) : null;
  if (parts) return { span, markdown: `${head}: ${parts}` };
  const data = problem && kind === 'touchstone' ? fileData(syntax, problem, path) : null;
  if (!data || data.frequencyHz.length === 0) return { span, markdown: `${head}: not read` };
  const { frequencyHz, ports, referenceOhm } = data;
  const [start, stop] = [frequencyHz[0], frequencyHz[frequencyHz.length - 1]].map((hz) => printQuantity(hz, 'Hz', { digits: 5 }));
  const points = frequencyHz.length === 1 ? `1 point at ${start}` : `${frequencyHz.length} points from ${start} to ${stop}`;
  return { span, markdown: `${head}: ${ports === 1 ? 'one port' : `${ports} ports`}, ${points}, against ${printQuantity(referenceOhm[0], 'Ω', { digits: 4 })}` };
}

export function familyHover({ model: { problem } }: Assessment, name: string, span: Span): Hover | null {
  const text = familyText(problem, name);
  return text === null ? null : { span, markdown: `**${plainText(name)}**: ${text}` };
}

/** `21 inductors, 1 nH to 47 nH`; null where its parts are not known. */
function familyText(problem: Problem | null, name: string): string | null {
  const family = problem?.families.find((candidate) => candidate.name === name);
  if (!family || family.members.length === 0) return null;
  const units = { resistor: 'Ω', inductor: 'H', capacitor: 'F' } as const;
  const ranges = (['inductor', 'capacitor', 'resistor'] as const).flatMap((kind) => {
    const values = family.members.filter(({ part }) => part.kind === kind).map(({ part }) => part.value);
    if (values.length === 0) return [];
    const [least, most] = [Math.min(...values), Math.max(...values)].map((value) => printQuantity(value, units[kind], { digits: 4 }));
    return [`${values.length} ${kind}${values.length === 1 ? '' : 's'}, ${least === most ? least : `${least} to ${most}`}`];
  });
  return ranges.join('; ');
}
