/** What lies under media/samples, by name: an extension that is served over the web cannot list its own folders. */
export const SAMPLE_FILES: readonly string[] = [
  'crate-reader/loop.match.yaml',
  'crate-reader/loop.s1p',
  'gate-reader/firmware/gate_codes.h',
  'gate-reader/gate-cart.s1p',
  'gate-reader/gate-empty.s1p',
  'gate-reader/gate-person.s1p',
  'gate-reader/gate.match.yaml',
  'orchard/frost-free-air.s1p',
  'orchard/frost-wet-bark.s1p',
  'orchard/frost.match.yaml',
];

/** The one to begin with. */
export const FIRST_SAMPLE = 'orchard/frost.match.yaml';
