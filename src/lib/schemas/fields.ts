import { z } from 'zod';
import { isReserved, isSlug } from '../domain/shared/slug';

/** Text on one line, trimmed. */
export const line = (max: number) =>
	z
		.string('Write text here.')
		.trim()
		.max(max, `Keep it to ${max} characters.`)
		.refine((text) => !/[\r\n]/.test(text), 'Keep it to one line.');

/** Text on several lines, trimmed. */
export const paragraphs = (max: number) =>
	z
		.string('Write text here.')
		.trim()
		.max(max, `Keep it to ${new Intl.NumberFormat('en').format(max)} characters.`);

/** The slug that addresses, directives and scripts will use; empty lets the application make it from the name. */
export const optionalSlug = z
	.string('Write text here.')
	.trim()
	.default('')
	.refine(
		(slug) => slug === '' || isSlug(slug),
		'Use lower-case letters a to z, figures and single hyphens, with at least one letter, up to 80 characters.'
	)
	.refine((slug) => !isReserved(slug), 'The application uses this word itself. Choose another.');

/** A row named by its slug or its id. */
export const reference = (message: string) =>
	z
		.union([z.string(message), z.int(message).positive(message)], message)
		.transform((ref) => String(ref).trim())
		.refine((ref) => ref !== '', message);

/** The empty choice of a select, which every list of choices refuses. */
export const unchosen = <T extends string>(): T => '' as T;

export interface NumberRule {
	min: number;
	max: number;
	/** Decimals allowed; 0 for whole numbers. */
	decimals: number;
	/** Excludes the bounds themselves. */
	open?: boolean;
}

/** What is wrong with a number as typed; null when nothing is. */
function fault(typed: string | number, rule: NumberRule): string | null {
	const text = String(typed).trim().replace(',', '.').replace('−', '-');
	if (!/^[+-]?(\d+\.?\d*|\.\d+)$/.test(text)) return 'Write a number in figures.';
	if ((text.split('.')[1] ?? '').replace(/0+$/, '').length > rule.decimals)
		return rule.decimals === 0 ? 'Write a whole number.' : `Write at most ${rule.decimals} decimals.`;
	const value = Number(text);
	if (value < rule.min || value > rule.max || (rule.open && (value === rule.min || value === rule.max)))
		return rule.open
			? `Write a number above ${rule.min} and below ${rule.max}.`
			: `Write a number from ${rule.min} to ${rule.max}.`;
	return null;
}

/** A number as typed in a field (decimal point or comma) or sent as JSON; the text stays in the form when it is refused. */
export const number = (rule: NumberRule) =>
	z
		.union([z.number(), z.string()], 'Write a number in figures.')
		.superRefine((typed, ctx) => {
			const message = fault(typed, rule);
			if (message) ctx.addIssue({ code: 'custom', message });
		})
		.transform((typed) => Number(String(typed).trim().replace(',', '.').replace('−', '-')));

/** The version of the row that the editor saw; an edit over a newer one is refused. */
export const versionSeen = z.coerce
	.number('The page is incomplete: load it again.')
	.int()
	.min(1, 'The page is incomplete: load it again.');
