/** @module The version, in one place for results and --version. */
export const VERSION = '0.1.0';
