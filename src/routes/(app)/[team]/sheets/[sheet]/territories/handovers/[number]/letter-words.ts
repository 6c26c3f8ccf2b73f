import type { MarkKind } from '$lib/components/Mark.svelte';
import { counted, date } from '$lib/components/format';
import type { HandoverTerritory } from '$lib/schemas/handover';

/** What became of letters, in words. */

export function sentInWords(result: {
	sent: number;
	failed: number;
	withoutAddress: number;
}): string {
	const { sent, failed, withoutAddress } = result;
	if (sent + failed + withoutAddress === 0) return 'Nothing was left to send.';
	return [
		sent ? `${counted(sent, 'letter')} sent.` : '',
		failed ? `${counted(failed, 'letter')} could not be sent: the reason stands beside each.` : '',
		withoutAddress
			? `${counted(withoutAddress, 'territory', 'territories')} without an address.`
			: '',
	]
		.filter(Boolean)
		.join(' ');
}

export function letterInWords({ letter, email }: HandoverTerritory): {
	mark: MarkKind | null;
	words: string;
} {
	if (!letter) {
		return email === ''
			? { mark: 'warning', words: 'No address: tell them otherwise' }
			: { mark: null, words: 'Not sent yet' };
	}
	const on = date(letter.at);
	const figures = letter.withFigures ? ', with figures' : '';
	switch (letter.state) {
		case 'answered':
			return { mark: 'clear', words: `Sent on ${on}${figures}, answered` };
		case 'sent':
			return {
				mark: null,
				words: `Sent on ${on}${figures}, no answer yet; link works until ${date(letter.expiresAt)}`,
			};
		case 'failed':
			return { mark: 'error', words: `Not sent: ${letter.failure ?? ''}` };
		case 'on its way':
			return { mark: null, words: 'On its way; if it stays so, send it again' };
		case 'expired':
			return { mark: 'warning', words: `Sent on ${on}; its link is too old by now` };
		case 'ended':
			return { mark: 'warning', words: `Sent on ${on}; its link was ended` };
	}
}
