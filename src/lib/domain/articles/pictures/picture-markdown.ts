const oneLine = (text: string): string => text.replace(/\s+/g, ' ').trim();

/**
 * A picture as it is written in the source; the title is its caption.
 * @example pictureMarkdown('/pictures/ab12….webp', { alt: 'The cooler', caption: '' }) === '![The cooler](/pictures/ab12….webp)'
 */
export function pictureMarkdown(address: string, { alt, caption }: { alt: string; caption: string }): string {
	const text = oneLine(alt).replace(/[\\[\]`*_<>!:]/g, '\\$&');
	const title = oneLine(caption).replace(/[\\"]/g, '\\$&');
	return `![${text}](${address}${title === '' ? '' : ` "${title}"`})`;
}
