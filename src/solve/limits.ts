/** The limit is shown for ladders of 1 … so many reactances. */
export const limitReactances = 4;
/**
 * Fewer points than this do not stand for the range between them: as many resonances as points can match each point, whatever
 * the limit is. Measured for 50 Ω || 5 pF, 1–2 GHz, |Γ| limit 0.135: four resonances reach 0.005 at 4 points, 0.166 at 5.
 */
export const pointsOfRange = limitReactances + 1;
/** Above this mismatch between load and first-order model there is no limit: what follows from the model says little. */
export const poorFit = 0.1;
/** Up to so many ladders all are tried: a search would not be faster. */
export const tryAllUpTo = 300_000;
/** Points that decide early about a ladder. */
export const decisivePoints = 4;
/** Load's sides of a ladder that are tabulated at once. */
export const prefixesAtOnce = 500_000;
/** Work of one search, in boxes, points and ladders looked at; what is found by then is given as not proved. */
export const searchNodes = 600_000_000;
/** A condition that needs a whole evaluation counts as so many nodes. */
export const nodesOfEvaluation = 2_000;
/** Values of each kind in a slot of the thinned catalogue that is searched first, by the number of slots. */
export const thinnedTo: readonly number[] = [18, 18, 18, 18, 18, 10, 7];
/** A value that may be anything is first looked for on a grid of so many a decade; a length at so many places of its range. */
export const gridPerDecade = 24;
export const lengthsTried = 72;
/** Seeds of each form and kinds, how many of them are refined for each number of parts, and in all. */
export const seedsPerForm = 3;
export const refinedPerCount = 12;
export const refinedAtMost = 60;
/** Work for the seeds of all forms and kinds together, and what one of them gets at least. */
export const seedNodes = 60_000_000;
export const leastSeedNodes = 500_000;
/** Builds for each solution's yield; fewer where each needs a whole evaluation. */
export const quickBuilds = 500;
export const slowBuilds = 100;
/** With a goal on yield so many times what is asked for is looked at: what reaches it may not have the largest margin. */
export const yieldPool = 3;
/** Parts of a catalogue that are tried around a value that follows from a chosen Q. */
export const nearestOfEach = 4;
/** Tables of more than these are not made; then the best found is given, not a proof. */
export const prefixesAtMost = 2_000_000;
export const suffixesAtMost = 500_000;
/** Starts of a search that is not exact, and its work, in items tried times slots. */
export const localStarts = 48;
export const localNodes = 10_000_000;
/** Whole ladders of values that may be anything are found with up to so many elements. */
export const wholeFreeElementsAtMost = 4;
/** So many places that may stay empty are tried in all combinations; of more, those that leave out, or fit, two at most. */
export const omissionsAtMost = 8;
/** With tunable parts in the ladder: evaluations of one point for trying all ladders with all codes … */
export const tunedPointsAtMost = 200_000_000;
/** … and starts, and points, of a search that goes one unknown at a time, where that would be more. */
export const tunedStarts = 8;
export const tunedLocalPoints = 40_000_000;
/** Steps of a free value end at this share of it. */
export const tunedLeastStep = 1e-4;
