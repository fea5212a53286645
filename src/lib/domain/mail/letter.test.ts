import { describe, expect, it } from 'vitest';
import { letter } from './letter';

const content = {
	subject: 'Approved: <b>Brisk</b>\r\nBcc: all@example.org',
	paragraphs: ['A & B\nsecond line'],
	quote: { words: 'one\ntwo', by: 'Marit' },
	link: { label: 'Open', href: 'https://desk.example/desk/articles/brisk?a=1&b="2"' },
	publication: 'Northlight Hardware',
	because: 'You wrote it.'
};

describe('letter', () => {
	it('keeps the subject on one line, whatever was typed', () => {
		expect(letter(content).subject).toBe('Approved: <b>Brisk</b> Bcc: all@example.org');
	});

	it('escapes everything in the HTML, the link included', () => {
		const { htmlBody } = letter(content);
		expect(htmlBody).not.toContain('<b>');
		expect(htmlBody).toContain('A &amp; B<br>second line');
		expect(htmlBody).toContain('a=1&amp;b=&quot;2&quot;');
	});

	it('says the same in plain text, with the words of others marked and one link', () => {
		const { textBody } = letter(content);
		expect(textBody).toContain('> one\n> two\n(Marit)');
		expect(textBody.match(/https:/g)).toHaveLength(1);
		expect(textBody).toContain('Northlight Hardware\nYou wrote it.');
	});
});
