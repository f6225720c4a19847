/** Points of an arc on the chart. */
export const arcPoints = 33;
/** A line's arc has a point for so many degrees of its turn (twice its electrical length) … */
export const lineArcStepDeg = 5;
/** … up to so many points. */
export const lineArcPointsAtMost = 361;

/** A bandwidth is looked for from the band's middle divided by this to the middle times this. */
export const bandwidthReach = 100;
/** Points looked at in one go while stepping outwards … */
export const bandwidthBlockPoints = 32;
/** … and while closing in on an edge. */
export const edgePoints = 16;
/** Width of the first block as a natural logarithm of frequency; each next one is as wide as all before it. */
export const bandwidthFirstBlock = 0.005;
/** An edge is closed in on until the bracket is this narrow relative to the frequency. */
export const bandwidthPrecision = 1e-9;

/** |Γ| this near to 1 is a rounded 1: total reflection. */
export const totalReflectionSlack = 1e-12;
/** All codes are tried while a channel has at most so many combinations; past it they are searched one tunable at a time. */
export const codeCombinationsAtMost = 1 << 22;
/** Margins that are held at once while all codes of several channels are tried. */
export const heldMarginsAtMost = 1 << 22;
/** Combinations of codes that are judged as a whole, over all channels, where a goal needs more than reflection and gain … */
export const wholeJudgementsAtMost = 1 << 16;
/** … and how many of each channel at least. */
export const wholeJudgementsAtLeast = 64;
/** Starts, and rounds from each, of a search that goes one tunable at a time. */
export const codeSearchStarts = 8;
export const codeSearchRounds = 50;
/** Evaluations of one point in a search for the codes of all channels. */
export const codePointsAtMost = 1 << 26;
/** Codes that take more evaluations of one point than this (some ten milliseconds) are not sought where somebody types. */
export const tuningInPlacePoints = 30_000;
