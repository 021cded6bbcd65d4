/** @module The version for --version: not the studies' own, which would load all the rooms for one word. Tests hold them alike. */
export const VERSION = '0.1.0';
