/** The checker of proof files: it stands alone, so that a page can carry it and nothing else. */
export { checkProofFile, checkProofText, notJson, type ProofChecked } from './check-proof-file.ts';
