/** Coverage -> who touches whom, how, and over how many metres; and what a sheet makes of it. */
export { borderKinds, type BorderKind, type BorderList } from './border-list.ts';
export { bordersOf, type BordersOptions } from './borders-of.ts';
