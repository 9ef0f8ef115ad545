/** The version of the engine; sealed evaluations name it. It changes with every change of a number. */
export const ENGINE_VERSION = '1.0.0';
