export * from './conventions.js';
export * from './optimal.js';
export * from './power.js';
