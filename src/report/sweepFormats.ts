import type { CaseTrace, Evaluation } from '../study/evaluation';
import type { NetworkData } from '../network/networkData';

const orNull = (value: number) => (Number.isFinite(value) ? value : null);
const at = <T>(points: Float64Array, make: (k: number) => T): T[] => Array.from(points, (_, k) => make(k));

/** The traces for programs: version 1, one entry a file. Points that are not known are null. */
export function sweepJson(files: readonly { readonly path: string; readonly evaluation: Evaluation }[]): object {
  return { version: 1, files: files.map(({ path, evaluation }) => ({ path, frequency: Array.from(evaluation.frequencyHz), cases: evaluation.traces.map((trace) => traceJson(trace, evaluation.frequencyHz)) })) };
}

function traceJson(trace: CaseTrace, frequencyHz: Float64Array): object {
  const pairOf = (array: { re: Float64Array; im: Float64Array }) =>
    at(frequencyHz, (k) => (trace.known[k] && Number.isFinite(array.re[k]) && Number.isFinite(array.im[k]) ? [array.re[k], array.im[k]] : null));
  return {
    case: trace.caseName,
    reflection: pairOf(trace.reflection),
    impedance: pairOf(trace.impedanceOhm),
    gain: at(frequencyHz, (k) => (trace.known[k] ? orNull(trace.gainDb[k]) : null)),
    efficiency: at(frequencyHz, (k) => (trace.known[k] ? orNull(trace.efficiency[k]) : null)),
    ...(trace.reason !== null && { reason: trace.reason }),
  };
}

/** One row a frequency and case (RFC 4180); empty cells where not known or infinite. */
export function sweepCsv(evaluation: Evaluation): string {
  const rows = [['case', 'frequency_hz', 'reflection_re', 'reflection_im', 'reflection_db', 'impedance_re_ohm', 'impedance_im_ohm', 'gain_db', 'efficiency'].join(',')];
  const cell = (known: number, value: number) => (known && Number.isFinite(value) ? String(value) : '');
  for (const trace of evaluation.traces) {
    const name = quoted(trace.caseName ?? '');
    evaluation.frequencyHz.forEach((frequencyHz, k) => {
      const known = trace.known[k];
      const { re, im } = trace.reflection;
      rows.push([
        name, String(frequencyHz), cell(known, re[k]), cell(known, im[k]), cell(known, 20 * Math.log10(Math.hypot(re[k], im[k]))),
        cell(known, trace.impedanceOhm.re[k]), cell(known, trace.impedanceOhm.im[k]), cell(known, trace.gainDb[k]), cell(known, trace.efficiency[k]),
      ].join(','));
    });
  }
  return rows.join('\r\n') + '\r\n';
}

const quoted = (text: string) => (/[",\r\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);

/** What the source sees in one case, against z0; only the points that are known. Null where none is. */
export function traceNetwork(trace: CaseTrace, frequencyHz: Float64Array, z0Ohm: number): NetworkData | null {
  const kept = at(frequencyHz, (k) => k).filter((k) => trace.known[k]);
  if (kept.length === 0) return null;
  return {
    ports: 1,
    frequencyHz: Float64Array.from(kept, (k) => frequencyHz[k]),
    referenceOhm: Float64Array.of(z0Ohm),
    sRe: Float64Array.from(kept, (k) => trace.chartReflection.re[k]),
    sIm: Float64Array.from(kept, (k) => trace.chartReflection.im[k]),
  };
}
