import type { Completion, CompletionContext, CompletionResult } from '@codemirror/autocomplete';
import type { ArticleData } from '../../../domain/articles/data';
import { allDirectives } from '../../../domain/articles/directives/all-directives';

const marks = { inline: ':', block: '::', container: ':::' } as const;

/** What has been written between the braces before the cursor. */
const given = (text: string): Record<string, string> =>
	Object.fromEntries(
		[...text.matchAll(/([\w-]+)=(?:"([^"]*)"|([^\s"{}]*))/g)].map(([, name, quoted, bare]) => [
			name ?? '',
			quoted ?? bare ?? ''
		])
	);

function names(before: string, from: number): CompletionResult | null {
	const typed = /(^|[^:\w]):{1,3}([a-z]*)$/.exec(before);
	if (!typed) return null;
	const onOwnLine = /^:{1,3}[a-z]*$/.test(before);
	const written = typed[0].slice((typed[1] ?? '').length);
	return {
		from: from - written.length,
		filter: false,
		options: allDirectives
			.filter((one) => (onOwnLine || one.level === 'inline') && one.name.startsWith(typed[2] ?? ''))
			.map((one): Completion => ({
				label: `${marks[one.level]}${one.name}`,
				detail: one.words,
				apply: `${marks[one.level]}${one.name}${one.attributes.length > 0 && one.level !== 'container' ? '{' : ''}`
			}))
	};
}

function attributes(before: string, from: number, data: ArticleData): CompletionResult | null {
	const open = /:{1,3}([a-z][\w-]*)\{([^{}]*)$/.exec(before);
	const one = open && allDirectives.find((directive) => directive.name === open[1]);
	if (!open || !one) return null;
	const inside = open[2] ?? '';
	const value = /([\w-]+)=("?)([^\s"{}]*)$/.exec(inside);
	if (value) {
		const attribute = one.attributes.find((known) => known.name === value[1]);
		const options = attribute?.values(data, given(inside)) ?? [];
		const typed = value[3] ?? '';
		return { from: from - typed.length, options: options.map((label) => ({ label })), validFor: /^[\w-]*$/ };
	}
	const typed = /(?:^|\s)([\w-]*)$/.exec(inside)?.[1];
	if (typed === undefined) return null;
	const used = given(inside);
	return {
		from: from - typed.length,
		validFor: /^[\w-]*$/,
		options: one.attributes
			.filter((attribute) => !(attribute.name in used))
			.map((attribute, index) => ({
				label: attribute.name,
				detail: attribute.words,
				apply: `${attribute.name}=`,
				boost: (attribute.required ? 50 : 0) - index
			}))
	};
}

/** Completes directives, their attributes, and the names that the article's campaigns have. */
export const directiveCompletion =
	(data: () => ArticleData) =>
	(context: CompletionContext): CompletionResult | null => {
		const line = context.state.doc.lineAt(context.pos);
		const before = line.text.slice(0, context.pos - line.from);
		return attributes(before, context.pos, data()) ?? names(before, context.pos);
	};
