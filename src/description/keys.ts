/** Where a key may stand. */
export type KeyPlace = 'description' | 'ladder entry' | 'case' | 'measured item' | 'firmware';

/** What stands after the colon. */
export type KeyContent = 'phrase' | 'mapping' | 'list' | 'phrase or mapping' | 'phrase or list' | 'list or phrase';

/** All that is said about one key of the language, once: reading, hover, completion and the reference draw on it. */
export interface KeyEntry {
  readonly name: string;
  readonly place: KeyPlace;
  readonly content: KeyContent;
  readonly required: boolean;
  /** One or two sentences of Markdown for hover, completion and reference. */
  readonly text: string;
  /** In the editor's snippet syntax, from the key on. */
  readonly snippet: string;
  /** As it stands in a description: whole lines, without the indentation of its place. */
  readonly example: string;
}

const key = (
  name: string, place: KeyPlace, content: KeyContent, text: string, snippet: string, example: string, required = false,
): KeyEntry => ({ name, place, content, required, text, snippet, example });

/** In the order in which a careful person writes them. */
export const keys: readonly KeyEntry[] = [
  key('ohmward', 'description', 'phrase', 'Version of the language; this is version 1. Required.', 'ohmward: 1', 'ohmward: 1', true),
  key(
    'title', 'description', 'phrase',
    'What this match belongs to, in a few words.',
    'title: ${1:Board, antenna port}',
    'title: Orchard frost sensor, antenna port',
  ),
  key(
    'z0', 'description', 'phrase',
    'Reference impedance of the chart and of VSWR: real and positive. Default 50 Ω.',
    'z0: ${1:50 Ω}',
    'z0: 50 Ω',
  ),
  key(
    'source', 'description', 'phrase or mapping',
    "The radio's own port. `wants` before the impedance: the load that the port should see, as data sheets print it; the port is then "
    + "its conjugate. "
    + 'A mapping by band gives each band its own. Default: `z0`.',
    'source: ${1:50 Ω}', 'source: wants 18 - j22 Ω',
  ),
  key(
    'power', 'description', 'phrase',
    'Power available from the source, for voltage, current and heat. Default 0 dBm.',
    'power: ${1:14 dBm}',
    'power: 14 dBm',
  ),
  key(
    'bands', 'description', 'mapping',
    'Where the match is judged: a range or one frequency for each name. 21 points unless it says `, n points`; `, watch` plots a band '
    + 'and leaves it out of goals without a place. '
    + "Without `bands` the load files' common span is the one band, `all`.",
    'bands:\n  ${1:uplink}: ${2:863 .. 870 MHz}', 'bands:\n  uplink: 863 .. 870 MHz\n  rx2: 869.525 MHz',
  ),
  key(
    'sweep', 'description', 'phrase',
    'What is plotted. Default: lowest edge × 0.8 .. highest edge × 1.25, 201 points.',
    'sweep: ${1:700 MHz .. 1.2 GHz, 401 points}',
    'sweep: 700 MHz .. 1.2 GHz, 401 points',
  ),
  key(
    'load', 'description', 'phrase or mapping',
    'The antenna or amplifier port: one impedance or file, a table by frequency, or a mapping of cases. Every goal must hold in each '
    + 'case unless it says `for CASE`. Required.',
    'load: ${1:antenna.s1p}', 'load:\n  free air: frost-free-air.s1p\n  wet bark: frost-wet-bark.s1p', true,
  ),
  key(
    'fixture', 'description', 'list', 'What lay between the load and the analyser, from the load outwards. It is removed from every case that is a Touchstone file.',
    'fixture:\n  - line F1: ${1:50 Ω, 11 mm, vf 0.66}', 'fixture:\n  - line F1: 50 Ω, 11 mm, vf 0.66',
  ),
  key(
    'ladder', 'description', 'list or phrase', 'The parts, first line at the load, last line at the source; or `solve …` for the whole ladder. Required.',
    'ladder:\n  - ${1|series,shunt|} ${2:L1}: ${3:solve}', 'ladder:\n  - series L1: 13 nH from coils\n  - shunt C1: solve from caps', true,
  ),
  key(
    'parts', 'description', 'mapping', 'Families of parts that may be used: a preferred series, a list, measured files, or a CSV file of parts at hand.',
    'parts:\n  ${1:coils}: ${2:inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz}', 'parts:\n  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz',
  ),
  key(
    'let', 'description', 'mapping',
    'Named values for expressions, each from numbers with units and names before it.',
    'let:\n  ${1:f0}: ${2:866.5 MHz}',
    'let:\n  f0: 866.5 MHz',
  ),
  key(
    'goals', 'description', 'list',
    'What must hold: quantity, comparison, value, then place and case.',
    'goals:\n  - ${1:return loss >= 12 dB}',
    'goals:\n  - return loss >= 12 dB in uplink\n  - gain >= -1.5 dB in uplink',
  ),
  key(
    'tunables', 'description', 'mapping', 'Parts that firmware sets by a code: so many bits over a range, or a table of codes.',
    'tunables:\n  ${1:antcap}: ${2:capacitor 5 bits 0.9 pF .. 4.6 pF}', 'tunables:\n  antcap: capacitor 5 bits 0.9 pF .. 4.6 pF Q 60 @ 900 MHz',
  ),
  key(
    'channels', 'description', 'phrase or list', "The frequencies that get a code each: a range with `step`, a list, or a band's name. Default: the points of all bands.",
    'channels: ${1:863.1 MHz .. 869.9 MHz step 200 kHz}', 'channels: 863.1 MHz .. 869.9 MHz step 200 kHz',
  ),
  key(
    'firmware', 'description', 'mapping', 'Where the table of codes goes. Only a file that carries its own marker line is overwritten.',
    'firmware:\n  header: ${1:../firmware/include/antenna_codes.h}\n  symbol: ${2:antenna_codes}', 'firmware:\n  header: ../firmware/include/antenna_codes.h\n  symbol: antenna_codes',
  ),
  key(
    'spread', 'description', 'phrase',
    'How part values lie within their tolerance: `uniform` (default), or `normal` with the tolerance at three sigma.',
    'spread: ${1|uniform,normal|}',
    'spread: normal',
  ),
  key('builds', 'description', 'phrase', 'Random builds for `yield`. Default 10,000.', 'builds: ${1:10000}', 'builds: 20000'),
  key(
    'seed', 'description', 'phrase',
    'Where the random builds start, so that they can be repeated. Default 1.',
    'seed: ${1:1}',
    'seed: 7',
  ),
  key(
    'measured', 'description', 'list',
    'What the analyser saw at the source end: `FILE` for the finished ladder, `NAME: FILE` for the step of building that ends with that '
    + 'element. `for CASE` is required where there are several cases.',
    'measured:\n  - ${1:finished.s1p}', 'measured:\n  - finished.s1p for free air\n  - L1: first-coil.s1p for free air',
  ),

  key(
    'series', 'ladder entry', 'phrase',
    'A part, or a branch of several, in the path.',
    'series ${1:L1}: ${2:5.6 nH}',
    '- series L1: 13 nH from coils',
  ),
  key(
    'shunt', 'ladder entry', 'phrase',
    'A part, or a branch of several, from the path to ground.',
    'shunt ${1:C1}: ${2:2.2 pF}',
    '- shunt trap: 3.9 nH Q 40 + 1.2 pF',
  ),
  key(
    'line', 'ladder entry', 'phrase',
    'A transmission line in the path: impedance and length, or the geometry of a microstrip.',
    'line ${1:T1}: ${2:50 Ω, 6 mm, vf 0.55}',
    '- line T1: 50 Ω, 6 mm, vf 0.55, 0.4 dB/m @ 1 GHz',
  ),
  key(
    'stub open', 'ladder entry', 'phrase',
    'A line hung across the path, open at its far end.',
    'stub open ${1:S1}: ${2:50 Ω, 90° at 868 MHz}',
    '- stub open S1: 50 Ω, 0.25 λ at 868 MHz',
  ),
  key(
    'stub short', 'ladder entry', 'phrase',
    'A line hung across the path, shorted at its far end.',
    'stub short ${1:S1}: ${2:50 Ω, 90° at 868 MHz}',
    '- stub short S2: 70 Ω, 12 mm, vf 0.6',
  ),
  key(
    'transformer', 'ladder entry', 'phrase',
    'Turns of the source side : load side, optionally with `winding` and `coupling`.',
    'transformer ${1:T1}: turns ${2:1:2}',
    '- transformer T2: turns 1:2, winding 3 µH, coupling 0.98',
  ),
  key(
    'block', 'ladder entry', 'phrase',
    'A two-port file in the path, port 1 toward the source unless `reversed`.',
    'block ${1:FL1}: ${2:filter.s2p}',
    '- block FL1: filter.s2p reversed',
  ),

  key(
    'file', 'case', 'phrase',
    "The case's impedance, where it has a fixture of its own.",
    'file: ${1:antenna.s1p}',
    'file: wet.s1p',
    true,
  ),
  key(
    'fixture', 'case', 'list',
    "Removed from this case's file instead of the common fixture.",
    'fixture:\n  - line F2: ${1:50 Ω, 11 mm, vf 0.66}',
    'fixture:\n  - line F2: 50 Ω, 14 mm, vf 0.66',
  ),
  key(
    'file', 'measured item', 'phrase',
    'The finished ladder, where the item has a fixture of its own.',
    'file: ${1:finished.s1p}',
    'file: finished.s1p for free air',
  ),
  key(
    'fixture', 'measured item', 'list',
    'What lay between the source end and the analyser in this measurement, from the ladder outwards.',
    'fixture:\n  - line F3: ${1:50 Ω, 11 mm, vf 0.66}',
    'fixture:\n  - line F3: 50 Ω, 8 mm, vf 0.66',
  ),
  key(
    'header', 'firmware', 'phrase',
    'C header that holds the table, relative to the description.',
    'header: ${1:antenna_codes.h}',
    'header: ../firmware/include/antenna_codes.h',
  ),
  key(
    'json', 'firmware', 'phrase',
    'JSON file that holds the table, relative to the description.',
    'json: ${1:antenna_codes.json}',
    'json: build/antenna_codes.json',
  ),
  key('symbol', 'firmware', 'phrase', "The table's name in the header.", 'symbol: ${1:antenna_codes}', 'symbol: antenna_codes'),
];

export const keysAt = (place: KeyPlace): readonly KeyEntry[] => keys.filter((entry) => entry.place === place);
export const keyNames = (place: KeyPlace): readonly string[] => keysAt(place).map((entry) => entry.name);
