/** What a mail says: the subject, its paragraphs in plain words, and the one link that matters. */
export interface LetterContent {
	subject: string;
	/** First line of the mail's body; the subject when left out. */
	heading?: string;
	paragraphs: string[];
	/** Somebody's own words, set apart from ours: a reason, a request for changes. */
	quote?: { words: string; by: string };
	link?: { label: string; href: string };
	/** The publication's name, under the mail. */
	publication: string;
	/** Why the reader gets this mail, in a sentence. */
	because: string;
}

/** A mail ready for the outbox: a subject on one line, and the same words as text and as HTML. */
export interface Letter {
	subject: string;
	textBody: string;
	htmlBody: string;
}

const escapes: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;'
};

/** Text made safe inside HTML and inside its attributes. @example escapeHtml('a < b') // 'a &lt; b' */
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (c) => escapes[c] ?? c);

/** Words on one line: line breaks and control characters would end a mail's header. */
export const oneLine = (text: string): string =>
	text
		.replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, ' ')
		.replace(/ {2,}/g, ' ')
		.trim();

const breaks = (text: string) => escapeHtml(text).replace(/\r?\n/g, '<br>');

function textOf({ heading, subject, paragraphs, quote, link, publication, because }: LetterContent): string {
	return [
		heading ?? subject,
		...paragraphs,
		...(quote ? [`${quote.words.replace(/^/gm, '> ')}\n(${quote.by})`] : []),
		...(link ? [`${link.label}:\n${link.href}`] : []),
		`-- \n${publication}\n${because}`
	].join('\n\n');
}

// Mail programs know neither our style sheet nor custom properties: colours stand inline, the light theme's.
function htmlOf({ heading, subject, paragraphs, quote, link, publication, because }: LetterContent): string {
	const serif = "font-family:'Source Serif 4',Georgia,serif";
	const sans = 'font-family:Helvetica,Arial,sans-serif';
	const parts = [
		`<h1 style="${serif};font-size:22px;line-height:1.25;margin:0 0 16px;color:#17202A">${escapeHtml(heading ?? subject)}</h1>`,
		...paragraphs.map((words) => `<p style="margin:0 0 14px">${breaks(words)}</p>`),
		...(quote
			? [
					`<blockquote style="margin:0 0 16px;padding:2px 0 2px 14px;border-left:3px solid #7A5A10">${breaks(quote.words)}<br><span style="color:#4A5560;font-size:13px">${escapeHtml(quote.by)}</span></blockquote>`
				]
			: []),
		...(link
			? [
					`<p style="margin:20px 0"><a href="${escapeHtml(link.href)}" style="background:#1D3F8F;color:#FFFEFA;padding:10px 16px;text-decoration:none;font-weight:600;border-radius:3px;display:inline-block">${escapeHtml(link.label)}</a></p>`
				]
			: []),
		`<p style="margin:28px 0 0;padding-top:10px;border-top:1px solid #D8D2C4;color:#4A5560;font-size:13px">${escapeHtml(publication)}<br>${escapeHtml(because)}</p>`
	];
	return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(oneLine(subject))}</title></head><body style="margin:0;padding:24px;background:#F6F3EC;color:#17202A;${sans};font-size:15px;line-height:1.5"><div style="max-width:560px;margin:0 auto;background:#FFFEFA;border-top:3px solid #17202A;padding:24px 28px">${parts.join('\n')}</div></body></html>`;
}

/** Composes a mail; nothing that a person typed can become markup or a second header. */
export const letter = (content: LetterContent): Letter => ({
	subject: oneLine(content.subject),
	textBody: textOf(content),
	htmlBody: htmlOf(content)
});
