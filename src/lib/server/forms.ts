import { error, fail, type ActionFailure } from '@sveltejs/kit';
import { z } from 'zod';
import { Forbidden } from './access/member.ts';
import { FilesAway } from './files/store.ts';
import { PoolBusy } from './jobs/pool.ts';
import { Conflict, NotFound, Refused, TooMany, Unfit } from './services/outcomes.ts';

/** What a form is told when it cannot be taken as it is. */
export interface FormProblem {
	message?: string;
	/** by field, in plain sentences */
	errors: Record<string, string[] | undefined>;
	/** what was typed, to be shown again; secrets are left out */
	values: Record<string, string>;
}

type Answer<T> =
	{ data: T; failure?: never } | { data?: never; failure: ActionFailure<FormProblem> };

/** Reads a form by its schema; what does not fit comes back as sentences by the field. */
export async function readForm<S extends z.ZodType>(
	request: Request,
	schema: S,
): Promise<Answer<z.output<S>>> {
	const form = await request.formData();
	const read = schema.safeParse(asObject(form));
	if (read.success) return { data: read.data };
	const errors: Record<string, string[]> = {};
	for (const issue of read.error.issues) {
		(errors[String(issue.path[0] ?? '')] ??= []).push(issue.message);
	}
	return { failure: fail(400, { errors, values: shownAgain(form) }) };
}

/** Names that occur several times become lists. */
function asObject(form: FormData): Record<string, FormDataEntryValue | FormDataEntryValue[]> {
	const names = [...new Set(form.keys())];
	return Object.fromEntries(
		names.map((name) => {
			const values = form.getAll(name);
			return [name, values.length > 1 ? values : (values[0] ?? '')];
		}),
	);
}

const secretNames = /password|current|secret|token/i;

function shownAgain(form: FormData): Record<string, string> {
	const typed = [...form].filter(
		(entry): entry is [string, string] =>
			typeof entry[1] === 'string' && !secretNames.test(entry[0]),
	);
	return Object.fromEntries(typed);
}

/**
 * Does what the form asks and turns a service's no into the answer for the page: a sentence by the form
 * where a rule forbids it, an error page where there is nothing to be mended.
 */
export async function attempt<T>(
	work: () => Promise<T>,
	values: Record<string, string> = {},
): Promise<Answer<T>> {
	try {
		return { data: await work() };
	} catch (problem) {
		if (problem instanceof Refused) {
			const errors = problem.field ? { [problem.field]: [problem.message] } : {};
			const message = problem.field ? undefined : problem.message;
			return { failure: fail(422, { message, errors, values }) };
		}
		if (problem instanceof TooMany) {
			return { failure: fail(429, { message: problem.message, errors: {}, values }) };
		}
		if (problem instanceof Conflict || problem instanceof Unfit) {
			const status = problem instanceof Conflict ? 409 : 422;
			return { failure: fail(status, { message: problem.message, errors: {}, values }) };
		}
		if (problem instanceof FilesAway || problem instanceof PoolBusy) {
			return { failure: fail(503, { message: problem.message, errors: {}, values }) };
		}
		if (problem instanceof NotFound) error(404, problem.message);
		if (problem instanceof Forbidden) error(403, 'Your roles in this team do not include this.');
		throw problem;
	}
}
