import { deserialize } from '$app/forms';

export type SendAnswer =
	{ kind: 'at'; location: string } | { kind: 'refused'; message: string } | { kind: 'cancelled' };

export interface Sending {
	answer: Promise<SendAnswer>;
	cancel: () => void;
}

const lost =
	'The connection was lost before the whole file had arrived. Nothing was kept; try again.';

/**
 * Sends a form action with its file and tells how far it is, which `fetch` cannot. Never rejects: every
 * way it can end is an answer.
 */
export function sendForm(
	action: string,
	content: FormData,
	progress: (share: number) => void,
): Sending {
	return send(action, content, progress, { 'x-sveltekit-action': 'true' }, read);
}

/** The same for an address that answers with `{ url }`, or with `{ message }` where it refuses. */
export const sendFile = (
	address: string,
	content: FormData,
	progress: (share: number) => void,
): Sending => send(address, content, progress, {}, readPlain);

function send(
	action: string,
	content: FormData,
	progress: (share: number) => void,
	headers: Record<string, string>,
	read: (request: XMLHttpRequest) => SendAnswer,
): Sending {
	const request = new XMLHttpRequest();
	const answer = new Promise<SendAnswer>((resolve) => {
		request.upload.onprogress = ({ loaded, total }) => progress(total ? loaded / total : 0);
		request.onabort = () => resolve({ kind: 'cancelled' });
		request.onerror = () => resolve({ kind: 'refused', message: lost });
		request.onload = () => resolve(read(request));
	});
	request.open('POST', action);
	request.setRequestHeader('accept', 'application/json');
	for (const [name, value] of Object.entries(headers)) request.setRequestHeader(name, value);
	request.send(content);
	return { answer, cancel: () => request.abort() };
}

function read({ status, responseText }: XMLHttpRequest): SendAnswer {
	if (status === 413)
		return { kind: 'refused', message: 'The file is larger than the server takes.' };
	try {
		const result = deserialize(responseText);
		if (result.type === 'redirect') return { kind: 'at', location: result.location };
		if (result.type === 'failure')
			return { kind: 'refused', message: String(result.data?.message ?? 'The file was refused.') };
		if (result.type === 'error')
			return { kind: 'refused', message: String(result.error?.message ?? lost) };
	} catch {
		return { kind: 'refused', message: `The server answered with an error (${status}).` };
	}
	return { kind: 'refused', message: 'The server did not say where the file went.' };
}

function readPlain({ status, responseText }: XMLHttpRequest): SendAnswer {
	if (status === 413)
		return { kind: 'refused', message: 'The file is larger than the server takes.' };
	try {
		const { url, message } = JSON.parse(responseText) as { url?: unknown; message?: unknown };
		if (status < 300 && typeof url === 'string') return { kind: 'at', location: url };
		return { kind: 'refused', message: String(message ?? 'The file was refused.') };
	} catch {
		return { kind: 'refused', message: `The server answered with an error (${status}).` };
	}
}
