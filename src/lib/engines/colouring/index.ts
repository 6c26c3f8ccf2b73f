/** Colouring: region graph and rules in; a colouring with its proof, or an explanation, out. */
export type {
	ColouringProblem,
	ColouringResult,
	Explanation,
	Proof,
	ProofKind,
	Release,
	Rule,
} from './problem.ts';
export { checkColouring } from './check-colouring.ts';
export { colour } from './colour.ts';
export { checkExplanation } from './explain-check.ts';
export { mostConflicts } from './effort.ts';
export { explanationSentence } from './explanation-sentence.ts';
export {
	gainOf,
	openQuestion,
	type Gain,
	type OpenQuestion,
	type Standing,
} from './open-question.ts';
export { checkBound, proveBound } from './prove-bound.ts';
export { problemFaults } from './faults.ts';
export { proofSentence } from './proof-sentence.ts';
export {
	collisionProof,
	openProof,
	proofFile,
	proofText,
	type OpenProof,
	type ProofFile,
	type RegionNames,
} from './proofs/index.ts';
export {
	checkProofFile,
	checkProofText,
	notJson,
	type ProofChecked,
} from './proofs/check/index.ts';
export { goalFigures, type GoalFigure } from './goal-figures.ts';
export { goalKinds, type GoalKind, type GoalWish } from './goal-wish.ts';
export { Improver, type AimFigure, type ImproveSettings } from './improve.ts';
export { partInks, type Parting, type PartingQuestion } from './part-inks.ts';
export { checkParting } from './check-parting.ts';
