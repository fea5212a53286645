import type { ArticleData } from '../data';
import type { Rendered } from '../render-article';

/** Where a finding is to be mended. */
export type Place =
	| { kind: 'line'; line: number }
	| { kind: 'comment'; id: number }
	| { kind: 'campaign'; campaign: string }
	| { kind: 'slot' }
	| { kind: 'title' }
	| { kind: 'standfirst' }
	| { kind: 'text' };

/** What a check found: what is wrong, where, and what to do about it. */
export interface Finding {
	/** Name of the check. */
	check: string;
	/** A blocking finding stops approval and print; advice does not. */
	severity: 'blocking' | 'advice';
	message: string;
	mend: string;
	place: Place;
}

/** What rendering an article says of it, as far as the checks ask. */
export type PageFacts = Pick<Rendered, 'errors' | 'uses' | 'cautions' | 'hasDisclosure'>;

/** A blocking comment that nobody has resolved. */
export interface OpenComment {
	id: number;
	quote: string;
	body: string;
	authorName: string;
}

/** Everything the checks look at. */
export interface PreflightInput {
	title: string;
	standfirst: string;
	/** The text as it was written. */
	source: string;
	page: PageFacts;
	data: ArticleData;
	blockingComments: OpenComment[];
	/** When it would be printed: its slot, or now for a publication at once; null while nobody has said. */
	printAt: Date | null;
	now: Date;
}

/** One check: reads the input, decides nothing else. */
export type Check = (input: PreflightInput) => Finding[];

/** Names in a sentence, the rest counted. @example listed(['a', 'b', 'c', 'd'], 2) // 'a, b and 2 more' */
export function listed(names: string[], most = 4): string {
	const shown = names.slice(0, most);
	if (names.length > most) return `${shown.join(', ')} and ${names.length - most} more`;
	const last = shown.pop() ?? '';
	return shown.length > 0 ? `${shown.join(', ')} and ${last}` : last;
}
