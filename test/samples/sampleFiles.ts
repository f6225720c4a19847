import { measuredFile, type InventedAntenna, type SweepSettings } from './inventedAntenna';

/** The measured files of the sample workspace, by path below `media/samples`. All of it is invented. */
const freeAir: InventedAntenna = {
  radiationOhm: 11, atHz: 868e6, lossOhm: 2.5, inductanceH: 6.2e-9, endCapacitanceF: 2.75e-12, feedCapacitanceF: 0.25e-12,
};

/** Wet bark beside the wire: more loss, and more capacitance at the end. */
const wetBark: InventedAntenna = { ...freeAir, radiationOhm: 10.5, lossOhm: 7, inductanceH: 6.4e-9, endCapacitanceF: 2.95e-12, feedCapacitanceF: 0.3e-12 };

/** A loop of four turns, 13.56 MHz: some 1.1 µH with a few ohms. */
const crateLoop: InventedAntenna = {
  radiationOhm: 0.05, atHz: 13.56e6, lossOhm: 1.9, inductanceH: 1.12e-6, endCapacitanceF: 1e-6, feedCapacitanceF: 1.8e-12,
};

/** A narrow patch in the post of a gate; what passes through it pulls it down in frequency. */
const gatePatch: InventedAntenna = {
  radiationOhm: 9, atHz: 915e6, lossOhm: 1.4, inductanceH: 42e-9, endCapacitanceF: 0.72e-12, feedCapacitanceF: 0.2e-12,
};
const gatePerson: InventedAntenna = { ...gatePatch, radiationOhm: 10, lossOhm: 2.4, endCapacitanceF: 0.722e-12 };
const gateCart: InventedAntenna = { ...gatePatch, radiationOhm: 8, lossOhm: 1.5, inductanceH: 41.8e-9 };

const gateComments = (situation: string) => [
  'Invented data from a physical model with noise; no product was measured',
  `Gate reader, antenna in the left post, ${situation}`,
  'Reference plane: the pads of the antenna',
];

const antennaSweep: SweepSettings = {
  startHz: 700e6, stopHz: 1000e6, points: 201, lineM: 0.011, velocityFactor: 0.66, noise: 0.0006, seed: 866,
  comments: [],
};

const frostComments = (situation: string) => [
  'Invented data from a physical model with noise; no product was measured',
  `Orchard frost sensor, antenna port, ${situation}`,
  'Reference plane: coaxial pigtail, 11 mm before the antenna pad',
  'Averages 16, bandwidth 1 kHz',
];

export function sampleFiles(): ReadonlyMap<string, string> {
  return new Map([
    ['orchard/frost-free-air.s1p', measuredFile(freeAir, { ...antennaSweep, comments: frostComments('free air') })],
    ['orchard/frost-wet-bark.s1p', measuredFile(wetBark, { ...antennaSweep, seed: 867, comments: frostComments('strapped to wet bark') })],
    ...([['gate-empty', gatePatch, 'gate empty', 915], ['gate-person', gatePerson, 'a person in it', 916], ['gate-cart', gateCart, 'a cart of metal in it', 917]] as const)
      .map(([name, antenna, situation, seed]): [string, string] => [`gate-reader/${name}.s1p`, measuredFile(antenna, {
        startHz: 850e6, stopHz: 980e6, points: 131, lineM: 0, velocityFactor: 1, noise: 0.0004, seed, comments: gateComments(situation),
      })]),
    ['crate-reader/loop.s1p', measuredFile(crateLoop, {
      startHz: 12e6, stopHz: 15e6, points: 151, lineM: 0, velocityFactor: 1, noise: 0.0002, seed: 1356,
      comments: ['Invented data from a physical model with noise; no product was measured', 'Crate tag reader, loop of four turns'],
    })],
  ]);
}
