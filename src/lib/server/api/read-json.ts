import type { z } from 'zod';
import { nestsDeeper } from '../../engines/colouring/proofs/check/nesting.ts';
import { bodyBytes } from './body-bytes.ts';
import { ApiFault } from './fault.ts';

/** The bytes of a JSON body; 415 for another type, 413 for too many, as soon as that shows. */
export const jsonBytes = (request: Request): Promise<Uint8Array> =>
	bodyBytes(request, 'application/json');

/** A body by its schema; whatever does not fit is named by its path. */
export function parseJson<S extends z.ZodType>(bytes: Uint8Array, schema: S): z.output<S> {
	const read = schema.safeParse(jsonValue(bytes));
	if (!read.success) throw unfit(read.error.issues);
	return read.data;
}

/** No body asked for here is half as deep; parsing megabytes of open brackets takes minutes. */
const deepest = 64;

function jsonIn(text: string): unknown {
	if (nestsDeeper(text, deepest)) throw new RangeError('it nests too deep');
	return JSON.parse(text);
}

/** What a page's script sent as JSON; undefined when it is none. */
export async function jsonOf(request: Request): Promise<unknown> {
	const text = await request.text();
	try {
		return jsonIn(text);
	} catch {
		return undefined;
	}
}

function jsonValue(bytes: Uint8Array): unknown {
	try {
		return jsonIn(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
	} catch (cause) {
		throw Object.assign(new ApiFault(400, 'malformed', 'the body is not JSON'), { cause });
	}
}

/** The first things that do not fit; an unknown field is named in the message itself. */
export function unfit(issues: readonly z.core.$ZodIssue[]): ApiFault {
	const listed = issues.slice(0, 20).map((issue) => ({
		path: issue.path.map(String).join('.'),
		message: issue.message,
	}));
	for (const issue of issues) {
		if (issue.code !== 'unrecognized_keys') continue;
		const fields = issue.keys.map((key) => [...issue.path, key].map(String).join('.'));
		const message = `there is no field ${fields.map((field) => `"${field}"`).join(', ')}`;
		return new ApiFault(400, 'unknown-field', message, { fields, issues: listed });
	}
	const [first] = listed;
	const message = first.path ? `${first.path}: ${first.message}` : first.message;
	return new ApiFault(400, 'malformed', message, { issues: listed });
}
