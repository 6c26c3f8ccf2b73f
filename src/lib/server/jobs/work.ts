/** Everything that runs in a thread, by name: called through a `Pool`, in the web process and the worker. */
export { colourGraph, recheck } from './colour.work.ts';
export { paintSheet, renderFiles } from './paint.work.ts';
export { readFile } from './read.work.ts';
