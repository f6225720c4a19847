import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import { idealPart, type Loss, type Part, type PartKind } from '../../src/network/part';
import { catalogueSearch, tryAll, type SearchTask } from '../../src/solve/catalogueSearch';
import { choiceAt, shapeOf, slotOf, type LadderShape, type Slot } from '../../src/solve/ladderShape';
import { trialOf } from '../../src/solve/trial';
import { blankPoints, type RestCheck, type TrialPoints } from '../../src/solve/trialPoints';

const runs = process.env.OHMWARD_LONG ? 5_000 : 400;

/** Invented points, parts and ladders, drawn at random. */
class Draw {
  constructor(private readonly value: fc.GeneratorValue) {}
  number(min: number, max: number): number {
    // Not fast-check's own doubles, which are mostly denormal or next to an end.
    return min + ((max - min) * this.whole(0, 1e6)) / 1e6;
  }
  whole(min: number, max: number): number {
    return this.value(fc.integer, { min, max });
  }
  chance(share: number): boolean {
    return this.number(0, 1) < share;
  }
  one<T>(...of: readonly T[]): T {
    return of[this.whole(0, of.length - 1)];
  }

  points(): TrialPoints {
    const cases = this.whole(1, 3);
    const each = this.whole(1, 7);
    const count = cases * each;
    const points = { ...blankPoints(count), starts: Array.from({ length: cases }, (_, i) => i * each) };
    const startHz = this.one(13.56e6, 433e6, 868e6, 2.4e9);
    const width = this.number(0, 0.3);
    for (let c = 0; c < cases; c++) {
      const [r, x, slope, weight, floor] = [this.number(0.5, 300), this.number(-300, 300), this.number(-200, 200), this.number(1, 1000), this.number(0.1, 0.9)];
      const source = this.chance(0.5) ? { re: 50, im: 0 } : { re: this.number(5, 200), im: this.number(-100, 100) };
      const kind = this.one('reflection', 'gain', 'both');
      for (let i = 0; i < each; i++) {
        const k = c * each + i;
        const place = each === 1 ? 0 : i / (each - 1);
        points.frequencyHz[k] = startHz * (1 + width * place);
        points.voltageRe[k] = r;
        points.voltageIm[k] = x + slope * place;
        points.sourceRe[k] = source.re;
        points.sourceIm[k] = source.im;
        if (kind !== 'gain') points.reflectionWeight[k] = weight;
        if (kind !== 'reflection') points.gainFloor[k] = floor;
      }
    }
    const rest: RestCheck[] = [];
    if (this.chance(0.2)) rest.push({ form: 'rejection at least', points: [this.whole(0, count - 1)], reference: [0], limit: this.number(1, 5) });
    if (this.chance(0.1)) rest.push({ form: 'efficiency at least', points: [this.whole(0, count - 1)], limit: this.number(0.1, 0.9) });
    return { ...points, rest };
  }

  part(kind: PartKind, middleHz: number): Part {
    const omega = 2 * Math.PI * middleHz;
    const reactance = 50 * 10 ** this.number(-1.3, 1.3);
    const value = kind === 'inductor' ? reactance / omega : kind === 'capacitor' ? 1 / (omega * reactance) : reactance;
    return idealPart(kind, value);
  }

  /** A family: values at random, one loss law, sometimes with a self-resonance. */
  family(kind: PartKind, middleHz: number, count: number): Part[] {
    const loss: Loss = kind === 'resistor'
      ? { law: 'none' }
      : this.one<Loss>({ law: 'none' }, { law: 'constant q', q: this.number(5, 200) }, { law: 'skin effect', q: this.number(5, 200), atHz: middleHz }, { law: 'resistance', resistanceOhm: this.number(0.01, 5) });
    const resonance = this.one(null, middleHz * this.number(1.1, 8));
    return Array.from({ length: count }, () => {
      const part = this.part(kind, middleHz);
      const eslH = kind === 'capacitor' && resonance !== null ? 1 / ((2 * Math.PI * resonance) ** 2 * part.value) * this.one(1, part.value / 1e-12) : 0;
      return { ...part, loss, eslH: Math.min(eslH, 1e-6), srfHz: kind === 'inductor' ? resonance : null };
    });
  }

  slot(orientation: 'series' | 'shunt', points: TrialPoints): Slot {
    const parts = this.one<PartKind[]>(['inductor', 'capacitor'], ['inductor'], ['capacitor'], ['capacitor', 'resistor'])
      .map((kind) => this.family(kind, points.frequencyHz[0], this.whole(1, 5)));
    const items = parts.flat().map((part): Element => ({ form: 'branch', name: 'X', orientation, branch: { form: 'part', part }, pair: this.chance(0.1) }));
    return slotOf(orientation, items, parts.flatMap((family, group) => family.map(() => group)), points.frequencyHz);
  }

  line(middleHz: number): Element {
    const lengthM = (this.number(0.01, 0.4) * 3e8) / middleHz;
    return { form: 'line', name: 'T', line: { impedanceOhm: this.number(20, 120), lengthM, velocityFactor: 0.7, conductorLossDb: this.one(0, 0.2), dielectricLossDb: 0, lossAtHz: middleHz } };
  }

  shape(points: TrialPoints): LadderShape {
    const steps: (Slot | readonly Element[])[] = [];
    const slots = this.one(2, 3, 3, 4);
    let orientation = this.one<'series' | 'shunt'>('series', 'shunt');
    for (let s = 0; s < slots; s++) {
      if (this.chance(0.15)) steps.push([this.line(points.frequencyHz[0])]);
      if (this.chance(0.07)) {
        const lines = Array.from({ length: this.whole(1, 3) }, () => this.line(points.frequencyHz[0]));
        steps.push(slotOf('through', lines, lines.map(() => 0), points.frequencyHz));
      }
      steps.push(this.slot(orientation, points));
      if (!this.chance(0.1)) orientation = orientation === 'series' ? 'shunt' : 'series';
    }
    return shapeOf(steps, points);
  }
}

const plainOrder = ({ count }: TrialPoints): Int32Array => Int32Array.from({ length: count }, (_, k) => k);

function compare(task: SearchTask): void {
  const all = tryAll(task, task.shapes.map((shape) => trialOf(shape, task.points, plainOrder(task.points))));
  const searched = catalogueSearch({ ...task, tryAllUpTo: 0 });
  const keys = (outcome: typeof all) => outcome.found.map(({ shape, index, missed, excess }) => [shape, index, missed, Number(excess.toPrecision(8))]);
  assert.deepEqual(keys(searched), keys(all));
  assert.equal(searched.proved, true);
}

describe('catalogue search', () => {
  it('finds the very same ladders as trying all: losses, resonances, lines, several cases, complex sources', () => {
    fc.assert(fc.property(fc.gen(), (value) => {
      const draw = new Draw(value);
      const points = draw.points();
      const shapes = Array.from({ length: draw.one(1, 1, 2) }, () => draw.shape(points));
      compare({ shapes, points, size: draw.one(1, 3, 10), missedOf: () => 0, leastMissed: 0, missedIsSlow: false });
    }), { seed: 20261201, numRuns: runs, endOnFailure: true });
  });

  it('finds the same where ladders miss conditions or must not be built', () => {
    fc.assert(fc.property(fc.gen(), (value) => {
      const draw = new Draw(value);
      const points = draw.points();
      const shape = draw.shape(points);
      const [modulus, refused] = [draw.whole(2, 5), draw.whole(2, 6)];
      const sum = (choice: Int32Array): number => choice.reduce((total, item) => total + item, 0);
      compare({
        shapes: [shape], points, size: draw.one(1, 5), leastMissed: 1, missedIsSlow: false,
        missedOf: (_, choice) => (sum(choice) % refused === 0 ? null : 1 + (sum(choice) % modulus === 0 ? 0 : 1)),
      });
    }), { seed: 20261202, numRuns: runs / 2, endOnFailure: true });
  });

  it('orders ladders that are equal but for rounding by their place', () => {
    const points: TrialPoints = { ...blankPoints(1), rest: [], starts: [0] };
    points.frequencyHz[0] = 1e8;
    points.reflectionWeight[0] = 1;
    // Two equal coils: the first of both is the answer, whichever slot it is in.
    const items = [10e-9, 22e-9, 22e-9, 10e-9].map((value): Element => ({ form: 'branch', name: 'L', orientation: 'series', branch: { form: 'part', part: idealPart('inductor', value) }, pair: false }));
    const slot = slotOf('series', items, items.map(() => 0), points.frequencyHz);
    const shape = shapeOf([slot, slot], points);
    const { found } = catalogueSearch({ shapes: [shape], points, size: 4, missedOf: () => 0, leastMissed: 0, missedIsSlow: false, tryAllUpTo: 0 });
    assert.deepEqual(found.map(({ index }) => [...choiceAt(shape, index)]), [[0, 0], [0, 3], [3, 0], [3, 3]]);
  });

  it('says that it is not proved where the work has a limit', () => {
    fc.assert(fc.property(fc.gen(), (value) => {
      const draw = new Draw(value);
      const points = draw.points();
      const shape = draw.shape(points);
      const task: SearchTask = { shapes: [shape], points, size: 3, missedOf: () => 0, leastMissed: 0, missedIsSlow: false, tryAllUpTo: 0 };
      const whole = catalogueSearch(task);
      const cut = catalogueSearch({ ...task, nodeLimit: Math.floor(whole.nodes / 2) });
      assert.ok(!cut.proved || cut.nodes <= whole.nodes);
      if (cut.proved) assert.deepEqual(cut.found.map(({ index }) => index), whole.found.map(({ index }) => index));
    }), { seed: 20261203, numRuns: 50, endOnFailure: true });
  });
});
