import type { ActionFailure } from '@sveltejs/kit';
import type { FormProblem } from '$lib/server/forms';

export const staleNews = 'Somebody else saved meanwhile; nothing was changed. Try again.';

/** A sentence for the page where it went well, else what is wrong. */
export const answered = (
	{ failure }: { failure?: ActionFailure<FormProblem> },
	said: string,
): ActionFailure<FormProblem> | { said: string } => failure ?? { said };
