import type { Finding, Question } from '../../engines/boundaries/index.ts';
import type { DeskEdition, DeskSheet, IntakeStatus } from '../../schemas/desk.ts';
import { colouringByKey, explanationByKey, proofByKey } from '../jobs/checks/keyed-result.ts';

/** A team's sheets as programs see them: regions by key. */

/** A finding without the mends that it offers. */
export const bare = ({ code, severity, message, regions, at }: Finding) => ({
	...{ code, severity, message, regions, at },
});

/** What is asked, without the drawings that people choose by. */
export const questionAnswer = ({ about, message, choices, free }: Question) => ({
	...{ about, message, free },
	choices: choices.map(({ value, words }) => ({ value, words })),
});

export const sheetAnswer = (sheet: DeskSheet) => ({
	number: sheet.number,
	name: sheet.name,
	revision: sheet.revision,
	savedAt: sheet.savedAt,
	savedBy: sheet.savedBy,
	boundaries: {
		fileName: sheet.boundarySet.fileName,
		planar: sheet.boundarySet.planar,
		source: sheet.boundarySet.source,
		columns: sheet.boundarySet.columns,
	},
	regions: sheet.regions.key.map((key, region) => ({
		key,
		name: sheet.regions.name[region],
		parts: sheet.regions.parts[region],
		areaKm2: sheet.regions.areaKm2[region],
		enclaveOf: sheet.regions.key[sheet.regions.enclaveOf[region]] ?? null,
	})),
	findings: sheet.findings.map(({ code, severity, message, regions, at, acceptedAt }) => ({
		...{ code, severity, message, regions, at },
		accepted: acceptedAt !== null,
	})),
	editions: sheet.editions,
});

export function colouringAnswer({ regions: { key: keys }, colouring, revision, draft }: DeskSheet) {
	if (!colouring) throw new Error('a stored draft has neither colouring nor explanation');
	if (colouring.status === 'undecided') {
		const { status, lowerBound, message } = colouring;
		return { status, revision, lowerBound, message };
	}
	if (colouring.status === 'impossible') {
		const explanation = explanationByKey(keys, colouring.explanation);
		return { status: colouring.status, revision, explanation };
	}
	const { status, inks, inksUsed, lowerBound, proof, sentence } = colouring;
	return {
		...{ status, revision, inksUsed, lowerBound },
		colouring: colouringByKey(keys, inks),
		inks: draft.palette.inks,
		proof: proofByKey(keys, proof),
		message: sentence,
	};
}

export const editionAnswer = ({
	number,
	digest,
	note,
	issuedAt,
	issuedBy,
	files,
}: DeskEdition) => ({
	...{ number, digest, note, issuedAt, issuedBy, files },
});

export const intakeAnswer = (intake: IntakeStatus) => ({
	id: intake.id,
	fileName: intake.fileName,
	fileBytes: intake.fileBytes,
	state: intake.state,
	step: intake.step,
	share: intake.share,
	refusal: intake.refusal && { ...intake.refusal, findings: intake.refusal.findings.map(bare) },
	question: intake.question && questionAnswer(intake.question),
	remembered: intake.remembered.map(({ about, words, fileName }) => ({ about, words, fileName })),
	sheet: intake.sheet,
});
