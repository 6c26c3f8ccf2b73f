/** Steps that mend a map while it is read. */
export type { Mend, MendOffer } from './mend.ts';
export { mendLayer, type Mended } from './mend-layer.ts';
