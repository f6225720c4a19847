import type { Complex } from '../../network/complex';
import { reflectionOf, sampleImpedance } from '../../network/immittance';
import type { Impedance } from '../../network/impedance';
import type { NetworkData } from '../../network/networkData';
import { idealPart } from '../../network/part';
import type { FileSyntax, ImpedanceSyntax } from '../syntax';
import { problemAt, type Resolution } from './resolution';
import { resolveFile } from './resolveFile';
import { resolvePart } from './resolvePart';

/** An impedance with files and families looked up; `unknown` with a reason where it cannot be had, which has been reported. */
export function resolveImpedance(syntax: ImpedanceSyntax, resolution: Resolution): Impedance {
  switch (syntax.form) {
    case 'part': {
      const part = resolvePart(syntax, resolution);
      return part ? { form: 'part', part } : unreadable;
    }
    case 'complex':
      return syntax.atHz ? reactanceAt(syntax.value, syntax.atHz.value) : { form: 'constant', impedanceOhm: syntax.value };
    case 'gamma':
      return { form: 'reflection', reflection: syntax.reflection, referenceOhm: resolution.z0Ohm };
    case 'open':
    case 'short':
      return { form: syntax.form };
    case 'series':
    case 'parallel':
      return { form: syntax.form, members: syntax.members.map((member) => resolveImpedance(member, resolution)) };
    case 'file':
      return resolveFileImpedance(syntax, resolution);
    case 'table':
      return resolveTable(syntax, resolution);
    case 'faulty':
      return unreadable;
  }
}

const unreadable: Impedance = { form: 'unknown', reason: 'it could not be read' };

/** R in series with the coil or capacitor that has this reactance at one frequency. */
function reactanceAt({ re, im }: Complex, atHz: number): Impedance {
  const omega = 2 * Math.PI * atHz;
  const resistance: Impedance = { form: 'constant', impedanceOhm: { re, im: 0 } };
  if (im === 0) return resistance;
  const part: Impedance = { form: 'part', part: im > 0 ? idealPart('inductor', im / omega) : idealPart('capacitor', -1 / (omega * im)) };
  return re === 0 ? part : { form: 'series', members: [resistance, part] };
}

function resolveFileImpedance(syntax: FileSyntax, resolution: Resolution): Impedance {
  const { data, reason } = resolveFile(syntax.path, resolution);
  if (!data) return { form: 'unknown', reason };
  const port = checkPort(syntax, data, resolution);
  return port === null ? unreadable : { form: 'file', data, port };
}

function checkPort(syntax: FileSyntax, data: NetworkData, { report }: Resolution): number | 'differential' | null {
  const name = syntax.path.value;
  const refuse = (message: string, fixes: string[] = []): null => {
    report(problemAt('port', message, syntax.span, {
      fixes: fixes.map((text) => ({ title: `Write «${text}»`, edits: [{ span: { start: syntax.path.span.end, end: syntax.span.end }, text: ` ${text}` }] })),
    }));
    return null;
  };
  const { ports } = data;
  if (syntax.port === null) {
    if (ports === 1) return 1;
    const ways = [...Array.from({ length: ports }, (_, i) => `port ${i + 1}`), ...(ports === 2 ? ['differential'] : [])];
    return refuse(`${name} has ${ports} ports; say which one is meant: ${ways.map((way) => `«${way}»`).join(', ')}.`, ways);
  }
  if (syntax.port === 'differential') return ports === 2 ? 'differential' : refuse(`«differential» needs a file with two ports; ${name} has ${ports}.`);
  if (Number.isInteger(syntax.port) && syntax.port >= 1 && syntax.port <= ports) return syntax.port;
  return refuse(`${name} has ${ports === 1 ? 'one port' : `the ports 1 to ${ports}`}, not port ${syntax.port}.`);
}

/** Rows become reflection coefficients against z0, in the order of frequency. */
function resolveTable(syntax: Extract<ImpedanceSyntax, { form: 'table' }>, resolution: Resolution): Impedance {
  const rows = syntax.rows.map(({ frequencyHz, impedance }) => {
    const at = Float64Array.of(frequencyHz.value);
    const sampled = sampleImpedance(resolveImpedance(impedance, resolution), at);
    const reflection = reflectionOf(sampled, resolution.z0Ohm);
    return { hz: frequencyHz.value, span: frequencyHz.span, known: sampled.known[0] === 1, re: reflection.re[0], im: reflection.im[0] };
  });
  const good = rows.filter((row) => row.known && row.hz > 0).sort((a, b) => a.hz - b.hz);
  const distinct = good.filter((row, i) => {
    const twice = i > 0 && good[i - 1].hz === row.hz;
    if (twice) resolution.report(problemAt('duplicate-frequency', 'This frequency stands in the table twice.', row.span));
    return !twice;
  });
  if (distinct.length === 0) return unreadable;
  return {
    form: 'table', referenceOhm: resolution.z0Ohm,
    frequencyHz: Float64Array.from(distinct, (row) => row.hz),
    reflectionRe: Float64Array.from(distinct, (row) => row.re),
    reflectionIm: Float64Array.from(distinct, (row) => row.im),
  };
}
