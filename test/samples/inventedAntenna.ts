import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { add, complex, divide, multiply, subtract, type Complex } from '../../src/network/complex';

/**
 * Invented antennas for the sample workspace: a physical model (radiation and loss resistance, inductance of the wire,
 * capacitance of its end, capacitance of the feed) seen through a piece of line, with the noise of an analyser. No real
 * product was measured.
 */
export interface InventedAntenna {
  readonly radiationOhm: number;
  /** Where `radiationOhm` holds; it grows with f². */
  readonly atHz: number;
  readonly lossOhm: number;
  readonly inductanceH: number;
  readonly endCapacitanceF: number;
  readonly feedCapacitanceF: number;
}

const speedOfLight = 299_792_458;
const one = complex(1);

export function antennaImpedance(antenna: InventedAntenna, frequencyHz: number): Complex {
  const omega = 2 * Math.PI * frequencyHz;
  const resistance = antenna.radiationOhm * (frequencyHz / antenna.atHz) ** 2 + antenna.lossOhm;
  const wire = complex(resistance, omega * antenna.inductanceH - 1 / (omega * antenna.endCapacitanceF));
  return divide(one, add(divide(one, wire), complex(0, omega * antenna.feedCapacitanceF)));
}

/** What the analyser shows at the far end of `lengthM` of 50 Ω line, before noise. */
function throughLine(impedance: Complex, frequencyHz: number, lengthM: number, velocityFactor: number): Complex {
  const reflection = divide(subtract(impedance, complex(50)), add(impedance, complex(50)));
  const turn = (-4 * Math.PI * frequencyHz * lengthM) / (velocityFactor * speedOfLight);
  return multiply(reflection, complex(Math.cos(turn), Math.sin(turn)));
}

export interface SweepSettings {
  readonly startHz: number;
  readonly stopHz: number;
  readonly points: number;
  readonly lineM: number;
  readonly velocityFactor: number;
  readonly noise: number;
  readonly seed: number;
  readonly comments: readonly string[];
}

/** A Touchstone 1.1 file as an analyser writes one: comment lines, MHz, real and imaginary parts. */
export function measuredFile(antenna: InventedAntenna, sweep: SweepSettings): string {
  const random = xoroshiro128plus(sweep.seed);
  // The sum of twelve uniform numbers less six is close enough to normal for noise.
  const normal = () => {
    let sum = -6;
    for (let i = 0; i < 12; i++) sum += uniformFloat64(random);
    return sum;
  };
  const rows: string[] = [];
  for (let i = 0; i < sweep.points; i++) {
    const frequencyHz = sweep.startHz + ((sweep.stopHz - sweep.startHz) * i) / (sweep.points - 1);
    const seen = throughLine(antennaImpedance(antenna, frequencyHz), frequencyHz, sweep.lineM, sweep.velocityFactor);
    const re = seen.re + sweep.noise * normal();
    const im = seen.im + sweep.noise * normal();
    rows.push(`${(frequencyHz / 1e6).toFixed(4)}  ${re.toFixed(6)}  ${im.toFixed(6)}`);
  }
  return [...sweep.comments.map((line) => `! ${line}`), '# MHz S RI R 50', ...rows, ''].join('\n');
}
