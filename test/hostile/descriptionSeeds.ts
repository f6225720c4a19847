import { csv, evenly, files, onePort, seriesTwoPort, touchstone } from '../description/support';

const frequencies = evenly(700e6, 1000e6, 41);

/** Files for the descriptions below; all of it invented. */
export const seedFiles = files({
  'free.s1p': touchstone(onePort(frequencies, (hz) => ({ re: 13, im: 2 * Math.PI * hz * 6e-9 - 1 / (2 * Math.PI * hz * 2.7e-12) }))),
  'wet.s1p': touchstone(onePort(frequencies, (hz) => ({ re: 18, im: 2 * Math.PI * hz * 6.5e-9 - 1 / (2 * Math.PI * hz * 2.9e-12) }))),
  'filter.s2p': touchstone(seriesTwoPort(frequencies, (hz) => ({ re: 0.4, im: 2 * Math.PI * hz * 1e-9 }))),
  'coil.s2p': touchstone(seriesTwoPort(frequencies, (hz) => ({ re: 0.6, im: 2 * Math.PI * hz * 5.6e-9 }))),
  'vendor/*.s2p': { form: 'pattern', paths: ['coil.s2p', 'filter.s2p'] },
  'stock.csv': csv('kind,value,tolerance,q,q_at,count,part\ninductor,6.8 nH,5 %,35,900 MHz,10,LA1\ncapacitor,2p2,0.1 pF,,,,CB1\n'),
  'gone.s1p': { form: 'missing' },
  'far.s1p': { form: 'refused', reason: 'it is outside the folder' },
});

/** Descriptions without a mistake that between them use every part of the language. */
export const seeds: readonly string[] = [
  `ohmward: 1
title: Orchard frost sensor, antenna port
z0: 50 Ω
source: 50 Ω
power: 14 dBm
bands:
  uplink: 863 .. 870 MHz
  rx2: 869.525 MHz
sweep: 700 MHz .. 1.2 GHz, 101 points   # what is plotted
load:
  free air: free.s1p
  wet bark: {file: wet.s1p, fixture: [line F2: "50 Ω, 14 mm, vf 0.66"]}
fixture:
  - line F1: 50 Ω, 11 mm, vf 0.66
ladder:
  - series L1: 13 nH from coils
  - shunt C1: solve from caps
  - series C2: solve from caps or none
parts:
  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz
  caps: capacitor E24 0.5 pF .. 47 pF ±0.1 pF Q 180 @ 1 GHz ESL 0.35 nH
  drawer: stock.csv
  measured: inductor files vendor/*.s2p
let:
  f0: 866.5 MHz
  x: = 2*pi*f0
goals:
  - return loss >= 12 dB in uplink
  - gain >= -1.5 dB in uplink for free air
  - rejection >= 18 dB at 2 x uplink into 50 Ω
  - yield >= 95 %
`,
  `ohmward: 1
bands: {low: "433 .. 435 MHz, 5 points", high: "863 .. 870 MHz, 7 points", near: "880 .. 900 MHz, 3 points, watch"}
source:
  low: wants 18 - j22 Ω
  high: 50 Ω
load:
  433 MHz: 18 - j37 Ω
  870 MHz: gamma 0.62 at -38°
ladder:
  - shunt trap: 3.9 nH Q 40 + 1.2 pF
  - line T1: 50 Ω, 6 mm, vf 0.55, 0.4 dB/m @ 1 GHz
  - stub open S1: 50 Ω, 90° at 868 MHz, 0.1 dB @ 1 GHz
  - line T2: microstrip width 0.35 mm, height 0.2 mm, permittivity 4.3, copper 35 µm, loss tangent 0.02, length 6 mm
  - transformer X1: turns 1:2, winding 3 µH, coupling 0.98
  - block FL1: filter.s2p reversed
  - series L2: "coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm"
  - series R1: 0 Ω
  - shunt C9: not fitted
  - shunt C3: tunable antcap
  - series L3: pair 5.6 nH ±2 % rated 300 mA
tunables:
  antcap: capacitor 3 bits 0.9 pF .. 4.6 pF Q 60 @ 900 MHz
  bank: {0b00: 1.1 pF, 0b01: 2.3 pF, 0x2: 3.4 pF, 3: 4.7 pF}
channels: 863.1 MHz .. 869.9 MHz step 400 kHz
firmware:
  header: ../firmware/include/antenna_codes.h
  symbol: antenna_codes
spread: normal
builds: 2000
seed: 7
measured:
  - free.s1p with antcap = 3
  - T1: wet.s1p
    fixture:
      - line F3: 50 Ω, 8 mm
goals:
  - VSWR <= 2
  - bandwidth >= 2 MHz at 3 dB in high
  - voltage L3 <= 30 V
  - dissipation load <= 10 mW
  - dc block
  - parts <= 12
`,
  `ohmward: 1
load: (18 - j37 Ω at 868 MHz) || 2 pF + 0.5 nH
bands: {up: 863 .. 870 MHz}
ladder: solve up to 3 elements from coils, caps
parts:
  coils: inductor [1 nH, 2.2 nH, 4.7 nH]
  caps: capacitor E6 1 pF .. 10 pF
`,
];
