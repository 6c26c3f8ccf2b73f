import { fail, type ActionFailure } from '@sveltejs/kit';
import type { FormProblem } from './forms.ts';
import type { SaveTerritoriesResult } from './services/territories-store.ts';

type Attempted =
	| { data: SaveTerritoriesResult; failure?: never }
	| { data?: never; failure: ActionFailure<FormProblem> };

/** What a form that saves territories answers: the revision saved, or that somebody else was first. */
export function savedOrStale(
	attempted: Attempted,
): { revision: number } | ActionFailure<FormProblem> {
	if (attempted.failure) return attempted.failure;
	if (attempted.data.status === 'saved') return { revision: attempted.data.saved.revision };
	const message = 'Somebody else saved meanwhile; nothing was changed. Try again.';
	return fail(409, { message, errors: {}, values: {} });
}
