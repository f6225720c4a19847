/** The example at the head of the language reference. Its load is invented. */
export const referenceExample = `ohmward: 1
title: Orchard frost sensor, antenna port
power: 14 dBm
bands:
  uplink: 863 .. 870 MHz
  rx2: 869.525 MHz
load:
  free air: frost-free-air.s1p
  wet bark: frost-wet-bark.s1p
fixture:                             # from the load outwards
  - line F1: 50 Ω, 11 mm, vf 0.66
ladder:                              # first line at the load, last line at the source
  - series L1: 13 nH from coils
  - shunt C1: solve from caps
  - series C2: solve from caps or none
parts:
  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz
  caps: capacitor E24 0.5 pF .. 47 pF ±0.1 pF Q 180 @ 1 GHz ESL 0.35 nH
goals:
  - return loss >= 12 dB in uplink
  - gain >= -1.5 dB in uplink
  - rejection >= 18 dB at 2 x uplink into 50 Ω`;

interface Chapter {
  readonly title: string;
  readonly paragraphs: readonly string[];
}

const yaml = (...lines: string[]) => `\`\`\`yaml\n${lines.join('\n')}\n\`\`\``;

const quantities: Chapter = {
  title: 'Quantities',
  paragraphs: [
    'A number, an optional SI prefix (p n µ m k M G) and a unit: `4.7 nH`, `4.7nH`, `4700 pH`. Units are Ω (or ohm), H, F, S, Hz, m, '
    + 'in, mil, ° (or deg), λ (or lambda), s, W, dBm, dB, V, A and %. Where the kind of the part gives the unit, '
    + 'letter codes (`4n7`, `2p2`, `4R7`) and a bare prefix (`5.6n`) do. `u` is taken as µ, `-` as −, `x` as ×, `>=` as ≥ and `+/-` as ±. '
    + 'Upper and lower case count: `10 mHz` and `3 pf` are errors, and the light bulb offers the fix.',
    'A range is `a .. b`, `a .. b step c` or `a .. b, n points`, the smaller end first; the unit of the second end serves a bare first '
    + 'one. A band is judged at 21 points, evenly spaced with both ends, unless it says how many.',
    yaml(
      'bands:', '  uplink: 863 .. 870 MHz', '  downlink: 902 .. 928 MHz, 53 points', '  neighbour: 880 .. 915 MHz, watch',
      '  beacon: 869.525 MHz',
    ),
    'An expression starts with `=` and goes to the end of the phrase, or stands in parentheses where figures follow. It does arithmetic '
    + 'on numbers with units and on names of `let`; a wrong unit is an error.',
    yaml('let:', '  f0: 866.5 MHz', '  x: 37 ohm', 'ladder:', '  - series C1: =(1/(2*pi*f0*x)) Q 180'),
    'Figures of a part follow its value, in any order: `±5 %`, `±0.1 pF`, `+10 % -5 %`; `Q 35 @ 900 MHz` (grows with √f as skin effect '
    + 'has it) or `Q 200` (the same everywhere); `ESR`, `ESL`, `SRF`; `rated 50 V` (peak), `rated 300 mA` (rms), `rated 0.1 W`; `from '
    + 'FAMILY`. '
    + 'Value and Q are those without the capacitance that SRF implies and without ESL. Q and ESR exclude each other, and so do SRF and '
    + 'ESL; a resistor takes ESL only.',
    yaml(
      'ladder:', '  - series L1: 6.8 nH ±5 % Q 35 @ 900 MHz SRF 6 GHz rated 300 mA', '  - shunt C1: 2p2 ±0.1 pF ESR 0.15 Ω ESL 0.4 nH',
      '  - series L2: "coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm"',
    ),
  ],
};

const impedances: Chapter = {
  title: 'Impedances',
  paragraphs: [
    '`18 - j37 Ω` is the same at every frequency. `18 - j37 Ω at 868 MHz` is a resistance in series with the coil or capacitor that has '
    + 'this reactance there. `gamma 0.62 at -38°` is a reflection coefficient against `z0`. '
    + 'Networks: `12 Ω + 3.3 pF` in series, `1.2 kΩ || 2 pF` in parallel, `||` before `+`, parentheses; `open` and `short`.',
    'Files: `antenna.s1p`; `front-end.s3p port 2`, the other ports closed in their references; `antenna.s2p differential`. A path ends '
    + 'at its extension; write `./open.s1p` where it would start like a word of the language. '
    + 'A table is a mapping whose keys are all frequencies; between them the reflection coefficient is interpolated linearly.',
    yaml('load:', '  863 MHz: 18 - j37 Ω', '  870 MHz: 19 - j34 Ω'),
    'A load may have cases, each an impedance, or `file` with a fixture of its own. A fixture is removed from files and from nothing '
    + 'else; a case that states its own fixture has that one removed instead of the common one.',
    yaml(
      'load:', '  free air: frost-free-air.s1p', '  wet bark: {file: frost-wet-bark.s1p, fixture: [line F2: "50 Ω, 14 mm, vf 0.66"]}',
      '  model: 12 Ω + 3.3 pF',
    ),
    "`source: 18 + j22 Ω` is the port's own impedance. `source: wants 18 - j22 Ω` is the load that the port should see; the port is "
    + "then its conjugate. Each band may have its own.",
    yaml('bands:', '  low: 433 .. 435 MHz', '  high: 863 .. 870 MHz', 'source:', '  low: wants 40 + j12 Ω', '  high: 50 Ω'),
  ],
};

const ladder: Chapter = {
  title: 'Unknown values and families',
  paragraphs: [
    '`solve` stands where a value is to be found, with an optional range, preferred series or families: `solve 1 .. 33 nH`, `solve from '
    + 'E24`, `solve from coils, caps`, `solve from caps or none`. Without a range the values tried are those whose reactance in the '
    + 'middle of the first band lies between z0/30 and 30·z0.',
    yaml(
      'ladder:', '  - series L1: solve 1 .. 33 nH Q 30 @ 900 MHz', '  - shunt C1: solve from E24 or none',
      '  - line T1: 50 Ω, solve 2 mm .. 40 mm, vf 0.55',
    ),
    'The whole ladder may be asked for: so many elements, or a pi or tee with a loaded Q or a bandwidth.',
    yaml(
      'ladder: solve up to 4 elements from coils, caps', 'parts:', '  coils: inductor E24 1 nH .. 47 nH',
      '  caps: capacitor E24 0.5 pF .. 47 pF',
    ),
    'A family is a preferred series of IEC 60063 with a range, a list in brackets, measured files, or a CSV file of the parts at hand. '
    + 'An entry takes from its family each figure that it does not state itself. '
    + 'The header row of a CSV is `kind,value` and optionally `tolerance,q,q_at,esr,esl,srf,rated,count,part,file`.',
    yaml(
      'parts:', '  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz', '  caps: capacitor [1 pF, 1.5 pF, 2.2 pF, 3.3 pF] ±0.1 pF',
      '  measured: inductor files vendor/*.s2p', '  drawer: stock.csv',
    ),
    '`pair 5.6 nH` is two equal parts, one in each leg of a balanced path. `not fitted` is an empty place across the path, `0 Ω` a '
    + 'bridge in series.',
    yaml('ladder:', '  - series L1: pair 5.6 nH', '  - shunt C1: not fitted', '  - series R1: 0 Ω'),
    'Parts that firmware sets have a code. Goals are then judged once a channel with the best codes of that channel: a goal on a band at '
    + 'the channels in it. A band, range or frequency that holds no channel is judged at its own points, with the codes of the nearest '
    + 'channel between the first and the last one, with those of every channel outside of them.',
    yaml(
      'tunables:', '  antcap: capacitor 5 bits 0.9 pF .. 4.6 pF Q 60 @ 900 MHz', '  bank: {0b00: 1.1 pF, 0b01: 2.3 pF, 0b10: 3.4 pF, 0b11: 4.7 pF}', 'ladder:', '  - shunt C3: tunable antcap', '  - series C4: tunable bank',
      'channels: 863.1 MHz .. 869.9 MHz step 200 kHz',
    ),
  ],
};

const goals: Chapter = {
  title: 'Goals',
  paragraphs: [
    '`QUANTITY (>=|<=|>|<) VALUE`, then optionally a place (`in BAND`, `in` a range, `at FREQUENCY`, `at N x BAND`), `for CASE`, `into '
    + 'IMPEDANCE` and `against BAND`. Without a place a goal holds in every band that is not watched.',
    'Quantities: `return loss`, `VSWR`, `reflection`, `mismatch loss`, `gain`, `insertion loss`, `efficiency`, `rejection`, `input '
    + 'resistance`, `input reactance`, `bandwidth`, `voltage NAME`, `current NAME`, `dissipation NAME`, `parts` and `yield`. Conditions '
    + 'without a value: `dc path`, `dc block`, `dc short at load`.',
    yaml(
      'bands:', '  uplink: 863 .. 870 MHz', 'ladder:', '  - series C1: 10 pF', 'goals:', '  - return loss >= 12 dB in uplink', '  - VSWR <= 2', '  - efficiency >= 80 %', '  - rejection >= 18 dB at 2 x uplink into 50 Ω', '  - bandwidth >= 20 MHz at 3 dB in uplink',
      '  - voltage C1 <= 30 V', '  - parts <= 3', '  - dc block', '  - yield >= 95 %',
    ),
  ],
};

const yamlTraps: Chapter = {
  title: 'Traps of YAML',
  paragraphs: [
    'A description is plain YAML 1.2, and a few of its rules surprise. A phrase with a colon and a space in it, with ` #`, or one that '
    + 'starts with `-`, `|`, `>` or a bracket stands in quotes. Inside braces and brackets a phrase with a comma does, too. '
    + 'A colon needs a space after it, and indentation is made of spaces. Numbers and words are read as they are written: `00`, `1e3` and '
    + '`null` are names and phrases. Anchors, aliases, tags, merge keys and several documents in one file are refused.',
    yaml('title: "Board #4: antenna"', 'load: {free: 12 Ω, wet: "(18 - j37 Ω) || 2 pF"}'),
  ],
};

export const referenceSections: { readonly opening: string; readonly ladder: string; readonly chapters: readonly Chapter[] } = {
  opening:
    'One small text file beside the firmware says what a port looks like, which parts sit between it and the radio, and what must hold. '
    + 'Its name ends in `.match.yaml` or `.match.yml`. Files that it names are relative to it.',
  ladder:
    'Each entry is one key, an orientation and a name, and one phrase. The name is a reference designator: R, L or C as its first '
    + 'letter tells the kind of a single part. Names are unique in ladder and fixture; `load` and `source` are taken.',
  chapters: [quantities, impedances, ladder, goals, yamlTraps],
};
