import { describe, expect, it } from 'vitest';
import { layoutForm } from './layout-form.ts';

const sent = {
	title: 'Wards',
	subtitle: '',
	paper: 'A3',
	orientation: 'portrait',
	marginMm: '10',
	projection: 'auto',
	groupColumn: '',
	labels: 'on',
	credits: '',
};

describe('a layout sent without script', () => {
	it('is read as the plain fields and nothing else, so that laid over a layout it wipes nothing', () => {
		const fields = layoutForm.parse({ ...sent, lines: '{}', frame: 'x', collar: '' });
		expect(Object.keys(fields).sort()).toEqual([...Object.keys(sent), 'legend', 'scaleBar'].sort());
		expect(fields).toMatchObject({ labels: true, legend: false, groupColumn: null, marginMm: 10 });
	});

	it('may ask for a paper of its own before its sides can be typed', () => {
		const { orientation: _, ...own } = { ...sent, paper: 'own' };
		const fields = layoutForm.parse(own);
		expect(fields.paper).toEqual({ widthMm: 420, heightMm: 297 });
		expect('orientation' in fields).toBe(false);
		expect(layoutForm.safeParse({ ...own, widthMm: '9', heightMm: '300' }).success).toBe(false);
	});
});
