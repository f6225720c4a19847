import type { Span } from '../../base/span';
import type { NetworkData } from '../../network/networkData';
import type { Loss, Part, PartKind } from '../../network/part';
import type { FiguresSyntax } from '../syntax';
import { doubtfulAbove, doubtfulBelow } from '../limits';
import { doubtAt, problemAt, type Resolution } from './resolution';

export const noFigures: FiguresSyntax = {
  tolerance: null, q: null, qAtHz: null, esrOhm: null, eslH: null, srfHz: null, ratedVoltageV: null, ratedCurrentA: null, ratedPowerW: null,
};

/** Own figures first; each that is not stated comes from the family. Q and ESR are one figure (the loss), SRF and ESL another. */
export function mergeFigures(own: FiguresSyntax, family: FiguresSyntax): FiguresSyntax {
  const loss = own.q || own.esrOhm ? own : family;
  const resonance = own.srfHz || own.eslH ? own : family;
  return {
    tolerance: own.tolerance ?? family.tolerance,
    q: loss.q, qAtHz: loss.qAtHz, esrOhm: loss.esrOhm,
    eslH: resonance.eslH, srfHz: resonance.srfHz,
    ratedVoltageV: own.ratedVoltageV ?? family.ratedVoltageV,
    ratedCurrentA: own.ratedCurrentA ?? family.ratedCurrentA,
    ratedPowerW: own.ratedPowerW ?? family.ratedPowerW,
  };
}

/**
 * A part from its value and figures. A capacitor's SRF becomes the inductance in series that resonates with it there;
 * an inductor keeps it, for the capacitance across.
 */
export function makePart(kind: PartKind, value: number, figures: FiguresSyntax, measured: NetworkData | null = null): Part {
  const srfHz = figures.srfHz?.value ?? null;
  const impliedH = kind === 'capacitor' && srfHz !== null ? 1 / ((2 * Math.PI * srfHz) ** 2 * value) : 0;
  const { tolerance, ratedVoltageV, ratedCurrentA, ratedPowerW } = figures;
  const rated = ratedVoltageV || ratedCurrentA || ratedPowerW;
  return {
    kind, value,
    loss: lossOf(kind, figures),
    eslH: kind === 'inductor' ? 0 : figures.eslH?.value ?? impliedH,
    srfHz: kind === 'inductor' ? srfHz : null,
    tolerance: tolerance && { form: tolerance.form, up: tolerance.up, down: tolerance.down },
    rating: rated ? { peakVoltageV: ratedVoltageV?.value ?? null, rmsCurrentA: ratedCurrentA?.value ?? null, dissipationW: ratedPowerW?.value ?? null } : null,
    measured,
  };
}

function lossOf(kind: PartKind, { q, qAtHz, esrOhm }: FiguresSyntax): Loss {
  if (kind === 'resistor') return { law: 'none' };
  if (q && qAtHz) return { law: 'skin effect', q: q.value, atHz: qAtHz.value };
  if (q) return { law: 'constant q', q: q.value };
  return esrOhm ? { law: 'resistance', resistanceOhm: esrOhm.value } : { law: 'none' };
}

const excluded = [
  { kind: 'resistor', figure: 'q', word: 'Q' }, { kind: 'resistor', figure: 'esrOhm', word: 'ESR' }, { kind: 'resistor', figure: 'srfHz', word: 'SRF' },
  { kind: 'inductor', figure: 'eslH', word: 'ESL' },
] as const;

/** Reports figures that do not go together, or not with the kind; returns those that may be used. */
export function checkFigures(kind: PartKind, figures: FiguresSyntax, { report }: Pick<Resolution, 'report'>): FiguresSyntax {
  let kept = figures;
  for (const { figure, word } of excluded.filter((each) => each.kind === kind)) {
    const stated = figures[figure];
    if (!stated) continue;
    const instead = kind === 'resistor' ? 'a resistor takes ESL only' : 'the value of an inductor is its whole inductance';
    report(problemAt('figure-of-other-kind', `${word} is not a figure of ${kind === 'inductor' ? 'an' : 'a'} ${kind}; ${instead}.`, stated.span));
    kept = { ...kept, [figure]: null };
  }
  if (kept.q && kept.esrOhm) {
    report(problemAt('q-with-esr', 'Q and ESR both state the loss; one of them is enough.', kept.esrOhm.span));
    kept = { ...kept, esrOhm: null };
  }
  if (kept.srfHz && kept.eslH) {
    report(problemAt('srf-with-esl', 'SRF and ESL both state the inductance in series; one of them is enough.', kept.eslH.span));
    kept = { ...kept, eslH: null };
  }
  return kept;
}

const unitOf: Readonly<Record<PartKind, string>> = { resistor: 'Ω', inductor: 'H', capacitor: 'F' };

/**
 * False for a value without physical sense, which is reported; a warning for one whose reactance in the middle of the
 * first band is out of all proportion to z0.
 */
export function checkValue(kind: PartKind, value: number, span: Span, resolution: Resolution): boolean {
  const { report, z0Ohm, middleHz, hasBands } = resolution;
  if (!Number.isFinite(value) || value < 0 || (value === 0 && kind !== 'resistor')) {
    report(problemAt('not-positive', `The value of ${kind === 'inductor' ? 'an' : 'a'} ${kind} is above zero ${unitOf[kind]}.`, span));
    return false;
  }
  if (!hasBands || kind === 'resistor') return true;
  const omega = 2 * Math.PI * middleHz;
  const reactance = kind === 'inductor' ? omega * value : 1 / (omega * value);
  if (reactance > z0Ohm * doubtfulAbove || reactance < z0Ohm * doubtfulBelow) {
    const amount = `${Number(reactance.toPrecision(2))} Ω`;
    report(doubtAt('doubtful-value', `Some ${amount} of reactance in the middle of the first band: is the prefix of the unit as meant?`, span));
  }
  return true;
}
