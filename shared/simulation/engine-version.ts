/** Raised whenever the same document, case and tolerance give different bits (a test of the step hash fails until it is). */
export const ENGINE_VERSION = 1;
