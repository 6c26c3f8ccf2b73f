import { describe, expect, it } from 'vitest';
import { whyNot } from './answer-words';

describe('why a form came to nothing', () => {
	it('is told by the message, else by the fields', () => {
		const refused = (data: object) => whyNot({ type: 'failure', status: 422, data });
		expect(refused({ message: 'Too many.', errors: {} })).toBe('Too many.');
		expect(refused({ errors: { kinds: ['Tick one.'], dpi: ['Too fine.'] } })).toBe(
			'Tick one. Too fine.',
		);
		expect(refused({ errors: {} })).toBe('It was refused.');
	});

	it('is told where no answer came, and where the server says what is wrong', () => {
		expect(whyNot({ type: 'error', error: new TypeError('Failed to fetch') })).toMatch(
			/^No answer came/,
		);
		const gone = { type: 'error', status: 404, error: { message: 'There is no such sheet here.' } };
		expect(whyNot(gone as Parameters<typeof whyNot>[0])).toBe('There is no such sheet here.');
	});

	it('is nothing where it went well or leads elsewhere', () => {
		expect(whyNot({ type: 'success', status: 200 })).toBeNull();
		expect(whyNot({ type: 'redirect', status: 303, location: '/sign-in' })).toBeNull();
	});
});
