/** Lengths, areas, rings and spatial search on flat arrays of longitude and latitude. */
export type { Coverage } from './coverage.ts';
export { geodesicMetres, karneyMetres, lineMetres, metresPerDegree } from './ellipsoid.ts';
export { sweptKm2 } from './areas.ts';
export { doubleArea, sideOfRing } from './rings.ts';
