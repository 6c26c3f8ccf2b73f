/** The coverage is the shape the geometry engine defines; stages after this one know it by this path. */
export type { Coverage } from '../geometry/coverage.ts';
