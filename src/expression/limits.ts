/** Bounds of one expression; far beyond what a description needs. */
export const expressionLimits = { characters: 400, depth: 40, nodes: 300 } as const;
