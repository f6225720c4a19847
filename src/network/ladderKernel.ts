import { cascade } from './cascade';
import type { ComplexArray } from './complex';
import type { Element } from './element';
import { powerWaveReflection, transducerGain } from './figures';
import type { Immittance } from './immittance';
import { factorAt, kernelSlot, lawAt, withValue, type KernelSlot } from './kernelSlot';
import { partModel } from './partModel';
import { endsOf, runLadder, SERIES, SERIES_THEN_SHUNT, SHUNT, THROUGH } from './runLadder';
import { throughElements } from './throughElements';

/**
 * A ladder made ready to be evaluated again and again with other values. The same numbers as `throughElements`,
 * `powerWaveReflection` and `transducerGain` (to rounding, `ladderKernel.test.ts`), many times faster and without
 * allocation.
 */
export interface LadderKernel {
  readonly points: number;
  /** |Γ| at the source's plane, power waves, after `evaluate`; NaN where not known. */
  readonly reflectionMagnitude: Float64Array;
  /** Transducer gain, linear, after `evaluate`; NaN where not known. */
  readonly gain: Float64Array;
  /** Another value (Ω, H, F) for the single part at `index`; its loss law, ESR, ESL and SRF stay. Throws where there is no such part. */
  setValue(index: number, value: number): void;
  /** Another element at `index`; this allocates. */
  setElement(index: number, element: Element): void;
  evaluate(): void;
}

/**
 * Compiles a ladder (load first). The frequencies (Hz, > 0) need not increase: several bands and load cases can stand one
 * after the other, each point with its own load and source.
 *
 * The loop goes through the points two by two, with their voltages and currents in registers from the load to the source;
 * the tables of all elements lie interleaved in the order in which it reads them.
 */
export function ladderKernel(elements: readonly Element[], frequencyHz: Float64Array, source: Immittance, load: Immittance): LadderKernel {
  const points = frequencyHz.length;
  const pairs = (points + 1) >> 1;
  const slots: KernelSlot[] = elements.map((element) => kernelSlot(element, frequencyHz));
  const values = new Float64Array(elements.length);
  // By element: where its numbers stand in a pair of points, and which of the factors is its own.
  const offsets = new Uint32Array(elements.length);
  const factorIndex = new Uint32Array(elements.length);
  let steps = new Uint8Array(0);
  let factors = new Float64Array(0);
  const known = new Uint8Array(points);
  let pairWidth = 0;
  let tables = new Float64Array(0);

  const ends = endsOf(source, load, 2 * pairs);
  const allMagnitudes = new Float64Array(2 * pairs);
  const allGains = new Float64Array(2 * pairs);

  function setValue(index: number, value: number): void {
    const slot = slots[index];
    const { part, proportional, operation } = slot;
    if (part === null || slot.element.form !== 'branch') throw new TypeError(`${slot.element.name} has no value to set`);
    values[index] = value;
    if (proportional) {
      factors[factorIndex[index]] = factorAt(slot, value);
      return;
    }
    const model = partModel(part, value);
    const legs = slot.element.pair ? 2 : 1;
    const shunt = operation === SHUNT;
    for (let k = 0; k < points; k++) lawAt(model, legs, shunt, frequencyHz[k], tables, (k >> 1) * pairWidth + offsets[index] + (k & 1) * 2);
  }

  /** Lays everything out anew: for each pair of points, for each element, its numbers at the one and at the other. */
  function layOut(): void {
    const order: number[] = [];
    let impedances = 0;
    pairWidth = 0;
    slots.forEach(({ operation, width }, i) => {
      offsets[i] = pairWidth;
      factorIndex[i] = impedances;
      pairWidth += 2 * width;
      if (operation === null) return;
      if (operation !== THROUGH) impedances++;
      if (operation === SHUNT && order.at(-1) === SERIES) order[order.length - 1] = SERIES_THEN_SHUNT;
      else order.push(operation);
    });
    steps = Uint8Array.from(order);
    factors = new Float64Array(impedances).fill(1);
    tables = new Float64Array(pairWidth * pairs);
    known.fill(1);
    slots.forEach((slot, i) => {
      for (let k = 0; k < points; k++) {
        const at = (k >> 1) * pairWidth + offsets[i] + (k & 1) * slot.width;
        for (let j = 0; j < slot.width; j++) tables[at + j] = slot.table[k * slot.width + j];
        if (slot.known !== null) known[k] &= slot.known[k];
      }
      if (slot.part !== null) setValue(i, values[i]);
    });
    for (let k = 0; k < points; k++) known[k] &= load.known[k] & source.known[k];
  }

  /** One point again in ratio form, for opens, shorts and very long ladders. */
  function evaluateCarefully(k: number): void {
    if (k >= points) return;
    if (known[k] === 0) {
      allMagnitudes[k] = NaN;
      allGains[k] = NaN;
      return;
    }
    const current = slots.map((slot, i) => (slot.part === null ? slot.element : withValue(slot, values[i])));
    const here = frequencyHz.slice(k, k + 1);
    const sourceHere = pointOf(source, k);
    const loadHere = pointOf(load, k);
    const { re, im } = powerWaveReflection(throughElements(current, loadHere, here), sourceHere);
    allMagnitudes[k] = Math.hypot(re[0], im[0]);
    allGains[k] = transducerGain(cascade(current, here), sourceHere, loadHere)[0];
  }

  slots.forEach(({ part }, i) => {
    values[i] = part === null ? 0 : part.value;
  });
  layOut();
  return {
    points,
    reflectionMagnitude: allMagnitudes.subarray(0, points),
    gain: allGains.subarray(0, points),
    setValue,
    setElement(index, element) {
      const slot = kernelSlot(element, frequencyHz);
      slots[index] = slot;
      values[index] = slot.part === null ? 0 : slot.part.value;
      layOut();
    },
    evaluate: () => runLadder(pairs, steps, factors, tables, ends, allMagnitudes, allGains, evaluateCarefully),
  };
}

function pointOf(z: Immittance, k: number): Immittance {
  const cut = ({ re, im }: ComplexArray) => ({ re: re.slice(k, k + 1), im: im.slice(k, k + 1) });
  return { numerator: cut(z.numerator), denominator: cut(z.denominator), known: z.known.slice(k, k + 1), reason: z.reason };
}
