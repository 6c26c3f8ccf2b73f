import { error } from '@sveltejs/kit';
import { Forbidden } from './access/member.ts';
import { FilesAway } from './files/store.ts';
import { PoolBusy, wasStopped } from './jobs/pool.ts';
import { Conflict, NotFound, Refused, TooMany } from './services/outcomes.ts';

/**
 * Does what a load or a handler asks and turns a service's no into the page, or the JSON, that says so.
 * Whatever is no answer of a service stays an error.
 */
export async function forPage<T>(work: () => Promise<T>): Promise<T> {
	try {
		return await work();
	} catch (problem) {
		if (problem instanceof NotFound) error(404, problem.message);
		if (problem instanceof Forbidden) error(403, 'Your roles in this team do not include this.');
		if (problem instanceof Conflict) error(409, problem.message);
		if (problem instanceof Refused) error(422, problem.message);
		if (problem instanceof TooMany) error(429, problem.message);
		if (problem instanceof PoolBusy || problem instanceof FilesAway) error(503, problem.message);
		if (wasStopped(problem)) error(503, 'It was stopped before it was done.');
		throw problem;
	}
}
