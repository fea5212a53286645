import {
	startCompletion,
	type Completion,
	type CompletionContext,
	type CompletionResult
} from '@codemirror/autocomplete';
import type { EditorView } from '@codemirror/view';
import type { ArticleData } from '../../../domain/articles/data';
import { allDirectives } from '../../../domain/articles/directives/all-directives';
import type { AnyDirective } from '../../../domain/articles/directives/shape';
import { nameInWords } from '../../../domain/articles/names-in-words';
import { writtenDirectives } from '../../../domain/articles/written-directives';

const marks: Record<string, string> = { inline: ':', block: '::', container: ':::' };
/** A directive is completed from what stands so far before the cursor. */
const reach = 700;

/** Puts text in place of what was typed, the cursor `back` signs before its end, and offers what comes next. */
const putting =
	(text: string, back: number) =>
	(view: EditorView, _completion: Completion, from: number, to: number): void => {
		view.dispatch({
			changes: { from, to, insert: text },
			selection: { anchor: from + text.length - back },
			userEvent: 'input.complete'
		});
		if (back > 0 || text.endsWith('=')) startCompletion(view);
	};

function applied(one: AnyDirective): Completion['apply'] {
	const head = `${marks[one.level] ?? ':'}${one.name}`;
	if ((one.level as string) === 'container') return putting(`${head}\n\n:::`, 4);
	return one.attributes.length > 0 || one.level === 'inline' ? putting(`${head}{}`, 1) : head;
}

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
				label: `${marks[one.level] ?? ':'}${one.name}`,
				detail: one.words,
				apply: applied(one)
			}))
	};
}

/** Names in a list with commas are those of the one attribute that takes a single one. */
const single: Record<string, string> = { profiles: 'subject' };

function valuesOf(one: AnyDirective, name: string, data: ArticleData, given: Record<string, string>) {
	const known = one.attributes.find((attribute) => attribute.name === (single[name] ?? name));
	return [...(known?.values(data, given) ?? [])].map((label): Completion => ({
		label,
		detail: nameInWords(name, label, data)
	}));
}

function attributes(before: string, from: number, data: ArticleData): CompletionResult | null {
	const written = writtenDirectives(before).at(-1);
	const one = written && allDirectives.find((directive) => directive.name === written.name);
	if (!one || written.closed || !written.inside || written.to !== before.length) return null;
	const inside = before.slice(written.inside.from);
	const given = Object.fromEntries(written.attributes.map(({ name, value }) => [name, value]));
	const value = /([\w-]+)=(?:"[^"]*|[^\s"{}]*)$/.exec(inside);
	if (value?.[1] !== undefined) {
		const typed = /[\w-]*$/.exec(inside)?.[0] ?? '';
		const options = valuesOf(one, value[1], data, given);
		return options.length === 0 ? null : { from: from - typed.length, options, validFor: /^[\w-]*$/ };
	}
	const typed = /(?:^|\s)([\w-]*)$/.exec(inside)?.[1];
	if (typed === undefined) return null;
	return {
		from: from - typed.length,
		validFor: /^[\w-]*$/,
		options: one.attributes
			.filter(({ name }) => !(name in given) || name === typed)
			.map(({ name, words, required }, index): Completion => ({
				label: name,
				detail: required ? `${words} (needed)` : words,
				apply: putting(`${name}=`, 0),
				boost: (required ? 50 : 0) - index
			}))
	};
}

/** Completes directives, their attributes, and the names that the article's campaigns have. */
export const directiveCompletion =
	(data: () => ArticleData) =>
	(context: CompletionContext): CompletionResult | null => {
		const { doc } = context.state;
		const line = doc.lineAt(context.pos);
		const start = doc.lineAt(Math.max(0, context.pos - reach)).from;
		return (
			attributes(doc.sliceString(start, context.pos), context.pos, data()) ??
			names(line.text.slice(0, context.pos - line.from), context.pos)
		);
	};
