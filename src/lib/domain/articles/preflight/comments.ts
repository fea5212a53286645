import type { Check } from './finding';

const short = (text: string) => (text.length > 90 ? `${text.slice(0, 88).trimEnd()}…` : text);

/** Blocking comments are resolved. */
export const comments: Check = ({ blockingComments }) =>
	blockingComments.map(({ id, quote, body, authorName }) => ({
		check: 'comments',
		severity: 'blocking',
		message: `${authorName} holds it back${quote ? ` at “${short(quote)}”` : ''}: ${short(body)}`,
		mend: 'Answer it in the text, then resolve the comment.',
		place: { kind: 'comment', id }
	}));
