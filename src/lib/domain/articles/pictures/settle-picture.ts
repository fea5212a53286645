import type { Tokens } from 'marked';
import type { ArticleData } from '../data';
import type { Placed } from '../markdown';
import { pictureAt } from './picture';
import { pictureFigure, pictureHtml } from './picture-html';

type Known = Pick<ArticleData, 'pictures' | 'missingPictures'>;
type Image = Pick<Tokens.Image, 'href' | 'text' | 'title'>;

const factsOf = (href: string, { pictures = [] }: Known) => {
	const sha256 = pictureAt(href);
	return sha256 === null ? undefined : pictures.find((one) => one.sha256 === sha256);
};
const wordsOf = ({ text, title }: Image) => ({ alt: text.trim(), title: title || null });

/** How an image that is a stored picture is set, or why not; undefined where it is none, or nothing is known of it yet. */
export function pictureOf(
	token: object,
	known: Known
): { html: string; problem?: undefined } | { html?: undefined; problem: string } | undefined {
	const image = token as Image;
	const sha256 = pictureAt(image.href ?? '');
	if (sha256 !== null && known.missingPictures?.includes(sha256))
		return { problem: 'This picture is not in the store. Put it in again, or take the line out.' };
	const facts = factsOf(image.href ?? '', known);
	return facts && { html: pictureHtml(facts, wordsOf(image)) };
}

/** The figure of a paragraph that holds a stored picture and nothing else; undefined for every other paragraph. */
export function pictureOfParagraph(token: Placed, known: Known): string | undefined {
	const [only, ...rest] = (token as Tokens.Paragraph).tokens.filter(
		(one) => !(one.type === 'text' && one.raw.trim() === '') && one.type !== 'br'
	);
	if (only?.type !== 'image' || rest.length > 0) return undefined;
	const image = only as Tokens.Image;
	const facts = factsOf(image.href, known);
	return facts && image.text.trim() !== '' ? pictureFigure(facts, wordsOf(image), token.line) : undefined;
}
