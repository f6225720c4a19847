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
    ['crate-reader/loop.s1p', measuredFile(crateLoop, {
      startHz: 12e6, stopHz: 15e6, points: 151, lineM: 0, velocityFactor: 1, noise: 0.0002, seed: 1356,
      comments: ['Invented data from a physical model with noise; no product was measured', 'Crate tag reader, loop of four turns'],
    })],
  ]);
}
