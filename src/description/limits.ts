/** A longer text is not read: no description by hand comes near it. In UTF-16 units. */
export const textAtMost = 200_000;
/** Mistakes that are shown; what comes after them is left out. */
export const diagnosticsAtMost = 100;
/** Brackets and braces inside each other. The YAML reader recurses, so deeper texts are refused before it sees them. */
export const flowDepthAtMost = 60;
/** Columns before the first word of a line, which bounds the depth of block style. */
export const indentationAtMost = 120;
/** Keys or dashes that open each other on one line (`- - - …`, `a: b: c: …`). */
export const opensOnOneLineAtMost = 40;
/** Repairs of YAML traps tried before the remaining errors are shown as they are. */
export const repairsAtMost = 60;
/** Rounds of repairing and reading again. */
export const repairRoundsAtMost = 3;
/** Lines that are left out so that the others can be read, and characters that are read again for it. */
export const skippedLinesAtMost = 10;
export const skippedCharactersAtMost = 200_000;
/** Levels of what YAML itself makes of a text, some of which mistakes make. */
export const treeDepthAtMost = 150;
/** Errors of the YAML reader itself that are shown. */
export const yamlErrorsAtMost = 20;

export const bandsAtMost = 100;
export const casesAtMost = 100;
export const elementsAtMost = 200;
export const goalsAtMost = 500;
export const familiesAtMost = 200;
export const familyMembersAtMost = 10_000;
export const tableRowsAtMost = 10_000;
export const tunablesAtMost = 20;
export const tunableStatesAtMost = 4096;
export const letsAtMost = 500;
export const measuredAtMost = 100;
export const channelsAtMost = 10_000;
/** Points of the sweep, of one band and of a goal's own range. */
export const pointsAtMost = 100_001;
export const csvTextAtMost = 20_000_000;

/** Default number of points of a band, of the sweep. */
export const bandPoints = 21;
export const sweepPoints = 201;
export const buildsAtMost = 10_000_000;
/** A reactance so many times above z0 in the middle of the first band is doubted, and one so many times below it. */
export const doubtfulAbove = 1e5;
export const doubtfulBelow = 1e-7;
/** Two values are the same family value where they differ by no more than this, relatively. */
export const sameValue = 1e-6;
/** Without a range an unknown reaches from z0 / this to z0 × this. */
export const reactanceReach = 30;
