/** The limit is shown for ladders of 1 … so many reactances. */
export const limitReactances = 4;
/** Above this mismatch between load and first-order model there is no limit: what follows from the model says little. */
export const poorFit = 0.1;
