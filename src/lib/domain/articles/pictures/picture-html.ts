import { element, escapeHtml } from '../html';
import { narrowerWidths, pictureAddress, type PictureFacts } from './picture';

export interface PictureWords {
	alt: string;
	title: string | null;
}

/** The measure of an article is 660 px; on a narrow screen a picture has the width of the page. */
const sizes = '(min-width: 720px) 660px, 100vw';

/** A stored picture as markup, in the widths that are kept, with its size so that the page does not move when it arrives. */
export function pictureHtml(facts: PictureFacts, { alt, title }: PictureWords): string {
	const { sha256, width, height, fallback } = facts;
	const webp = pictureAddress(sha256);
	const srcset = [
		...narrowerWidths(width).map((one) => `${webp}?w=${one} ${one}w`),
		`${webp} ${width}w`
	].join(', ');
	const image = `<img src="${pictureAddress(sha256, fallback)}" alt="${escapeHtml(alt)}"${
		title ? ` title="${escapeHtml(title)}"` : ''
	} width="${width}" height="${height}" loading="lazy" decoding="async">`;
	return `<picture><source type="image/webp" srcset="${srcset}" sizes="${sizes}">${image}</picture>`;
}

/** A picture that has a paragraph to itself: a figure, with its title as the caption. */
export function pictureFigure(
	facts: PictureFacts,
	{ alt, title }: PictureWords,
	line: number | undefined
): string {
	const caption = title ? element('figcaption', {}, escapeHtml(title)) : '';
	return element(
		'figure',
		{ class: 'picture', 'data-line': line },
		pictureHtml(facts, { alt, title: null }) + caption
	);
}
