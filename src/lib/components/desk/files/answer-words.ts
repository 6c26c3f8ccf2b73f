import type { ActionResult } from '@sveltejs/kit';

/** Why a form came to nothing, as one text; null where it did not. */
export function whyNot(result: ActionResult): string | null {
	if (result.type === 'failure') {
		const { message, errors } = (result.data ?? {}) as {
			message?: string;
			errors?: Record<string, string[] | undefined>;
		};
		const byField = Object.values(errors ?? {}).flatMap((one) => one ?? []);
		return message ?? (byField.length ? byField.join(' ') : 'It was refused.');
	}
	if (result.type !== 'error') return null;
	if (result.status === undefined) return 'No answer came, so nothing was done. Try again.';
	const said = (result.error as { message?: string } | null)?.message;
	return said ?? 'It could not be done because of a fault here. Try again.';
}
