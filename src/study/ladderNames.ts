/** Counts as an element's name in goals on voltage, current and dissipation. */
export const loadName = 'load';
