import { describe, expect, it } from 'vitest';
import { invitationMail } from './messages.ts';
import { asHtml } from './transport.ts';

describe('the form of a mail with markup', () => {
	it('lets no sign of markup through from a name', () => {
		const { text } = invitationMail({
			to: 'someone@example.com',
			inviter: '<img src=x onerror=alert(1)>',
			team: `"Maps" & 'Sons'`,
			roles: ['designer'],
			link: 'https://maps.example/invitation/abc?x=1&y="2"',
		});
		const html = asHtml(text);
		expect(html).not.toContain('<img');
		expect(html).toContain('&lt;img src=x onerror=alert(1)&gt;');
		expect(html).toContain('&quot;Maps&quot; &amp; &#39;Sons&#39;');
		expect(html.match(/<[^>]+>/g)?.every((tag) => /^<\/?(p|br|a)\b/.test(tag))).toBe(true);
	});

	it('makes a link of a line that is an address, and of nothing else', () => {
		expect(asHtml('https://maps.example/a')).toBe(
			'<p><a href="https://maps.example/a">https://maps.example/a</a></p>',
		);
		expect(asHtml('javascript:alert(1)')).toBe('<p>javascript:alert(1)</p>');
		expect(asHtml('see https://maps.example/a')).not.toContain('<a');
	});
});
