import type { Element } from '../network/element';
import { factorAt, kernelSlot, lawAt, type KernelSlot } from '../network/kernelSlot';
import { partModel } from '../network/partModel';
import { SERIES, SHUNT } from '../network/runLadder';
import { lineOfLength, partOfValue } from './positions';

/** An element whose one value may be anything: Ω, H or F of a part, the length in m of a line or stub. */
export interface FreeElement {
  readonly orientation: 'series' | 'shunt' | 'through';
  /** Two numbers a point, Z (series) or Y (shunt), or eight: A, B, C, D (through). */
  readonly width: 2 | 8;
  readonly value: number;
  /** Parts are searched by the logarithm of their value, lengths as they are. */
  readonly logarithmic: boolean;
  /** Writes the numbers of a value, always finite, at the first `count` of `points`: those of point k from k·stride + offset on. */
  write(value: number, points: Int32Array, count: number, table: Float64Array, stride: number, offset: number): void;
  /** The element with a value. */
  at(value: number): Element;
}

const speedOfLight = 299_792_458;
const nepersPerDb = Math.LN10 / 20;
/** What is infinite becomes this, so that later arithmetic stays in numbers. */
const blocking = 1e30;

const finite = (value: number): number => (value > blocking ? blocking : value < -blocking ? -blocking : Number.isNaN(value) ? blocking : value);

/** Frequencies in Hz, > 0. Throws where the element has no single value: blocks, transformers, measured parts, files. */
export function freeElement(element: Element, frequencyHz: Float64Array): FreeElement {
  if (element.form === 'line' || element.form === 'stub') return freeLength(element, frequencyHz);
  const slot = kernelSlot(element, frequencyHz);
  if (element.form !== 'branch' || element.branch.form !== 'part' || slot.part === null) throw new TypeError(`${element.name} has no value to set`);
  const { part } = element.branch;
  return {
    orientation: element.orientation, ...freePart(slot, element.pair ? 2 : 1, frequencyHz), value: part.value, logarithmic: true,
    at: (value) => ({ ...element, branch: { form: 'part', part: partOfValue(part, part.kind, value) } }),
  };
}

function freePart(slot: KernelSlot, legs: number, frequencyHz: Float64Array): Pick<FreeElement, 'width' | 'write'> {
  const { part, proportional, operation } = slot;
  if (part === null || (operation !== SERIES && operation !== SHUNT)) throw new TypeError(`${slot.element.name} has no value to set`);
  return {
    width: 2,
    write(value, points, count, table, stride, offset) {
      const factor = factorAt(slot, value);
      const model = partModel(part, value);
      for (let o = 0; o < count; o++) {
        const k = points[o];
        const at = k * stride + offset;
        if (proportional) {
          table[at] = factor * slot.table[2 * k];
          table[at + 1] = factor * slot.table[2 * k + 1];
        } else {
          lawAt(model, legs, operation === SHUNT, frequencyHz[k], table, at);
        }
        table[at] = finite(table[at]);
        table[at + 1] = finite(table[at + 1]);
      }
    },
  };
}

/** The formulas of `linePropagation.ts`, with all that does not change with the length worked out once. */
function freeLength(element: Extract<Element, { form: 'line' | 'stub' }>, frequencyHz: Float64Array): FreeElement {
  const { line } = element;
  const through = element.form === 'line';
  const phasePerM = frequencyHz.map((f) => (2 * Math.PI * f) / (line.velocityFactor * speedOfLight));
  const attenuation = frequencyHz.map((f) => {
    const ratio = f / line.lossAtHz;
    return (line.conductorLossDb * Math.sqrt(ratio) + line.dielectricLossDb * ratio) * nepersPerDb;
  });
  const lossless = attenuation.every((value) => value === 0);
  return {
    orientation: through ? 'through' : 'shunt', width: through ? 8 : 2, value: line.lengthM, logarithmic: false,
    at: (value) => ({ ...element, line: lineOfLength(line, value) }),
    write(value, points, count, table, stride, offset) {
      const share = line.lengthM > 0 ? value / line.lengthM : 1;
      for (let o = 0; o < count; o++) {
        const k = points[o];
        const m = k * stride + offset;
        const cosine = Math.cos(phasePerM[k] * value);
        const sine = Math.sin(phasePerM[k] * value);
        const loss = lossless ? 0 : Math.min(attenuation[k] * share, 300);
        const growth = lossless ? 1 : Math.cosh(loss);
        const rise = lossless ? 0 : Math.sinh(loss);
        // cosh γl and sinh γl.
        const [cRe, cIm, sRe, sIm] = [growth * cosine, rise * sine, rise * cosine, growth * sine];
        if (through) {
          table[m] = table[m + 6] = cRe;
          table[m + 1] = table[m + 7] = cIm;
          table[m + 2] = sRe * line.impedanceOhm;
          table[m + 3] = sIm * line.impedanceOhm;
          table[m + 4] = sRe / line.impedanceOhm;
          table[m + 5] = sIm / line.impedanceOhm;
        } else if (element.end === 'open') divide(table, m, sRe, sIm, cRe, cIm);
        else divide(table, m, cRe, cIm, sRe, sIm);
      }
    },
  };

  /** Y of a stub: top / bottom / Z0. */
  function divide(table: Float64Array, at: number, topRe: number, topIm: number, bottomRe: number, bottomIm: number): void {
    const size = (bottomRe * bottomRe + bottomIm * bottomIm) * line.impedanceOhm;
    table[at] = finite((topRe * bottomRe + topIm * bottomIm) / size);
    table[at + 1] = finite((topIm * bottomRe - topRe * bottomIm) / size);
  }
}
