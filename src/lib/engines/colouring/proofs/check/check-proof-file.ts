import { checkClaim } from './check-claim.ts';
import { limits } from './limits.ts';
import { nestsDeeper } from './nesting.ts';
import { readFile } from './read-file.ts';
import { mapSentence } from './sentences.ts';

/** What became of a proof file. */
export interface ProofChecked {
	/** every claim of the file was shown */
	valid: boolean;
	/** what was shown, in sentences */
	claims: string[];
	/** what was not, and why, in sentences */
	faults: string[];
	/** some claim was too large to be settled within the limits: it may hold or not */
	gaveUp: boolean;
	/** what the file is about, in a sentence; empty when it is no proof file */
	about: string;
}

/**
 * Checks a proof file from the file alone. It shares no code with what makes such files: it reads the
 * map, the rules and the claims, and looks at each claim from the start.
 *
 * In: anything, as `JSON.parse` returns it. Names in sentences are shortened but otherwise as they are, so
 * the caller escapes where it matters. Guarantee: `valid` only if every claim holds for the map and rules
 * in the file. Work and memory are bounded by `limits` and `steps`; what exceeds them is told as not settled.
 */
export function checkProofFile(input: unknown, steps = limits.steps): ProofChecked {
	const read = readFile(input);
	if ('fault' in read) return refused(read.fault);
	const { file } = read;
	const each = steps / file.claims.length;
	const found = file.claims.map((claim) => checkClaim(file, claim, each));
	const faults = found.flatMap((one) => ('fault' in one ? [one.fault] : []));
	return {
		valid: faults.length === 0,
		claims: found.flatMap((one) => ('said' in one ? [one.said] : [])),
		faults,
		gaveUp: found.some((one) => 'gaveUp' in one && one.gaveUp === true),
		about: mapSentence(file),
	};
}

/** The fault of a text that cannot be read at all. */
export const notJson = 'The file is not JSON.';

/** The same for the text of a file. */
export function checkProofText(text: string, steps = limits.steps): ProofChecked {
	if (text.length > limits.text) {
		const megabytes = Math.round(limits.text / 2 ** 20);
		return {
			...refused(`The file is longer than ${megabytes} MB and was not read.`),
			gaveUp: true,
		};
	}
	if (nestsDeeper(text, limits.depth)) return refused('The file nests deeper than a proof file.');
	const parsed = parsedJson(text);
	return parsed ? checkProofFile(parsed.value, steps) : refused(notJson);
}

function parsedJson(text: string): { value: unknown } | null {
	try {
		return { value: JSON.parse(text) };
	} catch {
		return null;
	}
}

const refused = (fault: string): ProofChecked => ({
	valid: false,
	claims: [],
	faults: [fault],
	gaveUp: false,
	about: '',
});
