import { describe, expect, it } from 'vitest';
import { standingOf } from './move-answers.ts';

type Answer = Parameters<typeof standingOf>[0][number];
const by = (territory_key: string | null, answer: Answer['answer'], word = ''): Answer => ({
	...{ territory_key, answer, word },
	author: territory_key ? `${territory_key}@field.example` : 'Petra',
});

// the rules of the handover list themselves: no source outside
describe('where a move stands', () => {
	it('is proposed while nobody has said anything', () => {
		expect(standingOf([], ['a', 'b'])).toEqual({ state: 'proposed', word: '', by: '' });
	});

	it('is accepted once everybody who was asked has accepted', () => {
		expect(standingOf([by('a', 'accepted')], ['a', 'b']).state).toBe('proposed');
		expect(standingOf([by('a', 'accepted'), by('b', 'accepted')], ['a', 'b']).state).toBe(
			'accepted',
		);
		expect(standingOf([by('a', 'accepted')], ['a']).state).toBe('accepted');
	});

	it('is disputed by one, whatever the other says', () => {
		const answers = [by('a', 'disputed', 'too far'), by('b', 'accepted')];
		expect(standingOf(answers, ['a', 'b'])).toEqual({
			...{ state: 'disputed', word: 'too far' },
			by: 'a@field.example',
		});
	});

	it('keeps the words of two who dispute', () => {
		const answers = [by('a', 'disputed', 'too far'), by('b', 'disputed', 'my customer')];
		expect(standingOf(answers, ['a', 'b']).word).toBe('too far / my customer');
	});

	it('counts the last word of each', () => {
		const answers = [by('a', 'disputed', 'too far'), by('a', 'accepted'), by('b', 'accepted')];
		expect(standingOf(answers, ['a', 'b']).state).toBe('accepted');
	});

	it('is settled by a planner, until somebody disputes again', () => {
		const settled = [by('a', 'disputed', 'too far'), by(null, 'accepted', 'agreed by telephone')];
		expect(standingOf(settled, ['a'])).toMatchObject({ state: 'accepted', by: 'Petra' });
		expect(standingOf([...settled, by('a', 'disputed', 'no')], ['a']).state).toBe('disputed');
		expect(standingOf([...settled, by(null, 'proposed')], ['a']).state).toBe('proposed');
	});

	it('stays disputed where a planner wrote the dispute down', () => {
		const answers = [by(null, 'disputed', 'rang up'), by('a', 'accepted')];
		expect(standingOf(answers, ['a']).state).toBe('disputed');
	});
});
