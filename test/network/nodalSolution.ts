import { abs, complex, lusolve, type Complex as MathComplex } from 'mathjs';
import type { Complex } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import type { Line } from '../../src/network/line';
import type { Part } from '../../src/network/part';

/**
 * Modified nodal analysis (Ho, Ruehli, Brennan, «The modified nodal approach to network analysis», IEEE Trans. CAS-22,
 * 1975) of a whole ladder at one frequency, solved by a general matrix library. It shares nothing with the product but the
 * description of the ladder: every resistor, inductance and capacitance is a branch of its own, lines are y-parameters
 * between two nodes, transformers and two-port files are equations between port voltages and currents.
 */
export interface NodalResult {
  /** (V − Zs*·I)/(V + Zs·I) at the source's terminals. */
  readonly reflection: Complex;
  readonly gain: number;
}

type Row = Map<number, MathComplex>;

const LIGHT_M_PER_S = 299792458;
const DB_PER_NEPER = 20 / Math.LN10;

class Equations {
  private readonly rows: Row[] = [];
  private readonly right: MathComplex[] = [];

  /** A new unknown (a node's voltage or a branch's current) with an equation of its own; returns its index. */
  unknown(): number {
    this.rows.push(new Map());
    this.right.push(complex(0, 0));
    return this.rows.length - 1;
  }

  /** Adds to a coefficient; index −1 is ground and falls away. */
  add(row: number, column: number, re: number, im = 0): void {
    if (row < 0 || column < 0) return;
    const old = this.rows[row].get(column) ?? complex(0, 0);
    this.rows[row].set(column, complex(old.re + re, old.im + im));
  }

  drive(row: number, value: number): void {
    this.right[row] = complex(value, 0);
  }

  solve(): MathComplex[] {
    const size = this.rows.length;
    const matrix = this.rows.map((row) => Array.from({ length: size }, (_, j) => row.get(j) ?? complex(0, 0)));
    const solution = lusolve(matrix as never, this.right.map((value) => [value]) as never) as unknown as MathComplex[][];
    return solution.map(([value]) => complex(value as never) as unknown as MathComplex);
  }
}

const GROUND = -1;

export function solveNodally(ladder: readonly Element[], load: Complex, source: Complex, frequencyHz: number): NodalResult {
  const equations = new Equations();
  const omega = 2 * Math.PI * frequencyHz;
  const loadNode = equations.unknown();
  const loadCurrent = branch(equations, loadNode, GROUND, load.re, load.im);
  let node = loadNode;
  for (const element of ladder) node = stampElement(equations, element, node, omega);
  // 1 V behind Zs drives the last node: V + Zs·I = 1, I flows into it.
  const current = equations.unknown();
  equations.add(current, node, 1);
  equations.add(current, current, source.re, source.im);
  equations.drive(current, 1);
  equations.add(node, current, -1);
  const solution = equations.solve();
  const v = solution[node];
  const i = solution[current];
  const reflection = { re: v.re - (source.re * i.re + source.im * i.im), im: v.im - (source.re * i.im - source.im * i.re) };
  return { reflection, gain: 4 * source.re * load.re * Number(abs(solution[loadCurrent])) ** 2 };
}

/** A branch R + jX from one node to another with its current as an unknown; returns that. */
function branch(equations: Equations, from: number, to: number, re: number, im: number): number {
  const current = equations.unknown();
  equations.add(from, current, 1);
  equations.add(to, current, -1);
  equations.add(current, from, 1);
  equations.add(current, to, -1);
  equations.add(current, current, -re, -im);
  return current;
}

function stampElement(equations: Equations, element: Element, node: number, omega: number): number {
  switch (element.form) {
    case 'branch': {
      const far = element.orientation === 'series' ? equations.unknown() : GROUND;
      if (element.pair) {
        // One in each leg: two of them in the loop.
        const middle = equations.unknown();
        stampTree(equations, element.branch, node, middle, omega);
        stampTree(equations, element.branch, middle, far, omega);
      } else {
        stampTree(equations, element.branch, node, far, omega);
      }
      return far === GROUND ? node : far;
    }
    case 'bridge': case 'not fitted': return node;
    case 'line': {
      const far = equations.unknown();
      stampLine(equations, element.line, node, far, omega);
      return far;
    }
    case 'stub': {
      stampLine(equations, element.line, node, element.end === 'short' ? GROUND : equations.unknown(), omega);
      return node;
    }
    case 'transformer': {
      const far = equations.unknown();
      const into = equations.unknown();
      const out = equations.unknown();
      equations.add(far, into, 1);
      equations.add(node, out, 1);
      if (element.windingH === null) {
        // V1·nL = V2·nS and I1·nS + I2·nL = 0, both currents into the transformer.
        equations.add(into, far, element.turnsLoad);
        equations.add(into, node, -element.turnsSource);
        equations.add(out, into, element.turnsSource);
        equations.add(out, out, element.turnsLoad);
      } else {
        const first = omega * element.windingH;
        const second = first * (element.turnsLoad / element.turnsSource) ** 2;
        const mutual = element.coupling * Math.sqrt(first * second);
        equations.add(into, far, 1);
        equations.add(into, into, 0, -first);
        equations.add(into, out, 0, -mutual);
        equations.add(out, node, 1);
        equations.add(out, into, 0, -mutual);
        equations.add(out, out, 0, -second);
      }
      return far;
    }
    case 'block': {
      const far = equations.unknown();
      const currents = [equations.unknown(), equations.unknown()];
      const nodes = element.reversed ? [node, far] : [far, node];
      const { data } = element;
      const point = data.frequencyHz.findIndex((f) => Math.abs(omega / (2 * Math.PI * f) - 1) < 1e-12);
      if (point < 0) throw new RangeError('blocks are solved at points of their data only');
      // b = S·a with a, b = (V ± z·I)/(2√z), port by port.
      for (const i of [0, 1]) {
        equations.add(nodes[i], currents[i], 1);
        for (const j of [0, 1]) {
          const re = data.sRe[4 * point + 2 * i + j];
          const im = data.sIm[4 * point + 2 * i + j];
          const z = data.referenceOhm[j];
          const root = Math.sqrt(z);
          equations.add(currents[i], nodes[j], -re / root + (i === j ? 1 / root : 0), -im / root);
          equations.add(currents[i], currents[j], -re * root - (i === j ? root : 0), -im * root);
        }
      }
      return far;
    }
    default: throw new TypeError(`cannot solve ${element.form}`);
  }
}

function stampLine(equations: Equations, line: Line, p: number, q: number, omega: number): void {
  const ratio = omega / (2 * Math.PI) / line.lossAtHz;
  const nepers = (line.conductorLossDb * Math.sqrt(ratio) + line.dielectricLossDb * ratio) / DB_PER_NEPER;
  const phase = (omega * line.lengthM) / (line.velocityFactor * LIGHT_M_PER_S);
  // coth and csch of γl from e^(−2γl), apart from any cosh or sinh.
  const squaredRe = Math.exp(-2 * nepers) * Math.cos(2 * phase);
  const squaredIm = -Math.exp(-2 * nepers) * Math.sin(2 * phase);
  const onceRe = Math.exp(-nepers) * Math.cos(phase);
  const onceIm = -Math.exp(-nepers) * Math.sin(phase);
  const below = (1 - squaredRe) ** 2 + squaredIm ** 2;
  const over = (re: number, im: number): [number, number] => [
    (re * (1 - squaredRe) - im * squaredIm) / below / line.impedanceOhm,
    (im * (1 - squaredRe) + re * squaredIm) / below / line.impedanceOhm,
  ];
  const own = over(1 + squaredRe, squaredIm);
  const cross = over(-2 * onceRe, -2 * onceIm);
  equations.add(p, p, ...own);
  equations.add(q, q, ...own);
  equations.add(p, q, ...cross);
  equations.add(q, p, ...cross);
}

function stampTree(equations: Equations, tree: Impedance, from: number, to: number, omega: number): void {
  switch (tree.form) {
    case 'part': stampPart(equations, tree.part, from, to, omega); return;
    case 'parallel': for (const member of tree.members) stampTree(equations, member, from, to, omega); return;
    case 'series': {
      let node = from;
      tree.members.forEach((member, i) => {
        const next = i === tree.members.length - 1 ? to : equations.unknown();
        stampTree(equations, member, node, next, omega);
        node = next;
      });
      return;
    }
    default: throw new TypeError(`cannot solve ${tree.form}`);
  }
}

/** Value, its loss and its ESL one after the other; SRF's capacitance beside them. */
function stampPart(equations: Equations, part: Part, from: number, to: number, omega: number): void {
  const reactance = part.kind === 'inductor' ? omega * part.value : part.kind === 'capacitor' ? -1 / (omega * part.value) : 0;
  const afterLoss = equations.unknown();
  branch(equations, from, afterLoss, part.kind === 'resistor' ? part.value : lossOhm(part, reactance, omega), 0);
  const afterValue = equations.unknown();
  branch(equations, afterLoss, afterValue, 0, reactance);
  branch(equations, afterValue, to, 0, omega * part.eslH);
  if (part.srfHz !== null) {
    const across = 1 / ((2 * Math.PI * part.srfHz) ** 2 * part.value);
    branch(equations, from, to, 0, -1 / (omega * across));
  }
}

function lossOhm({ loss, kind, value }: Part, reactance: number, omega: number): number {
  switch (loss.law) {
    case 'none': return 0;
    case 'resistance': return loss.resistanceOhm;
    case 'constant q': return Math.abs(reactance) / loss.q;
    case 'skin effect': {
      const stated = 2 * Math.PI * loss.atHz;
      return ((kind === 'inductor' ? stated * value : 1 / (stated * value)) / loss.q) * Math.sqrt(omega / stated);
    }
  }
}
