/** Proof files: what a third party needs to see that a claim holds. Their checker is `check/`. */
export { collisionProof } from './collision-proof.ts';
export { openProof, type OpenProof } from './open-proof.ts';
export { proofFile, proofText, type RegionNames } from './proof-file.ts';
export type { Claim, ClauseEvidence, Evidence, ProofFile, ShapeEvidence } from './proof-form.ts';
