import { kindOf } from '../../../domain/articles/kinds';
import type { ArticleTemplate } from '../../../domain/articles/template';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile, slugMissing } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { TemplateEdit, TemplateInput, TemplateRetire } from '../../../schemas/template';
import type { Context } from '../../context';
import { inTransaction, isDuplicate, type Transaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as templates from '../../db/queries/article-template';
import { shippedTemplate } from '../../rendering/templates';
import { templateInUse, type TemplateInUse } from './templates-in-use';

type Written = Outcome<{ kind: string }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>;
type Text = Omit<ArticleTemplate, 'kind'>;

const onlyEditors = () => refuse('forbidden', 'Only editors change templates.');

const taken = (kind: string) =>
	refuse('conflict', `Nothing was saved: another template is called “${kind}”.`, {
		fields: { kind: ['Another template has this short name. Choose a different one.'] }
	});

const rowOf = (ctx: Context, templateId: number, number: number, text: Text, note: string) => ({
	templateId,
	number,
	name: text.name,
	title: text.title,
	standfirst: text.standfirst,
	purpose: text.for,
	body: text.body,
	checklist: text.checklist,
	savedBy: ctx.actor.id,
	savedAt: ctx.now,
	note
});

/** What the log keeps of a text: the revisions hold it whole. */
const said = (ctx: Context, act: string, subjectId: number, after: Record<string, unknown>) => ({
	at: ctx.now,
	actorId: ctx.actor.id,
	act,
	subjectKind: 'template',
	subjectId,
	after
});

/** The first revision of the lab's own; for a kind that ships, what is held against is the file. */
async function begin(ctx: Context, tx: Transaction, kind: string, text: Text, act: string, note: string) {
	const id = await templates.insert(tx, kind);
	await templates.addRevision(tx, rowOf(ctx, id, 1, text, note));
	await audit.append(tx, [said(ctx, act, id, { kind, revision: 1, name: text.name })]);
	return done({ kind });
}

/** Adds a template of the lab's own. */
export async function createTemplate(
	ctx: Context,
	{ kind: given, ...text }: TemplateInput
): Promise<Written> {
	if (!may(ctx.actor, 'template.edit')) return onlyEditors();
	const kind = given || slugOf(text.name);
	if (kind === '' || isReserved(kind)) return slugMissing();
	if (shippedTemplate(kind)) return taken(kind);
	try {
		return await inTransaction(ctx.db, (tx) => begin(ctx, tx, kind, text, 'template.create', ''));
	} catch (error) {
		if (isDuplicate(error)) return taken(kind);
		throw error;
	}
}

/** Saves a revision over the version that was seen; 0 stands for a file that nobody has changed. */
async function save(
	ctx: Context,
	kind: string,
	version: number,
	act: string,
	decide: (before: TemplateInUse) => { text: Text; note: string } | null
): Promise<Written> {
	if (!may(ctx.actor, 'template.edit')) return onlyEditors();
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const before = await templateInUse(tx, kind);
			const next = before && decide(before);
			if (!before || !next) return refuse('not_found', `There is no template “${kind}”.`);
			const { own } = before;
			if ((own?.version ?? 0) !== version) return changedMeanwhile('template', own?.version ?? 0);
			if (!own) return begin(ctx, tx, kind, next.text, act, next.note);
			const head = own.head + 1;
			if (!(await templates.update(tx, own.id, version, { head })))
				return changedMeanwhile('template', own.version);
			await templates.addRevision(tx, rowOf(ctx, own.id, head, next.text, next.note));
			await audit.append(tx, [said(ctx, act, own.id, { kind, revision: head, name: next.text.name })]);
			return done({ kind });
		});
	} catch (error) {
		// Two who change what ships at once: the later finds the row of the earlier.
		if (isDuplicate(error)) return changedMeanwhile('template', 1);
		throw error;
	}
}

/** Changes a template. Articles that began from it stay as they are. */
export const editTemplate = (ctx: Context, kind: string, { version, ...text }: TemplateEdit) =>
	save(ctx, kind, version, 'template.edit', () => ({ text, note: '' }));

/** Goes back to what ships, as one more revision, so that what the lab had written stays. */
export const restoreTemplate = (ctx: Context, kind: string, { version }: { version: number }) =>
	save(ctx, kind, version, 'template.restore', () => {
		const file = shippedTemplate(kind);
		return file ? { text: { ...file, name: kindOf(kind) }, note: 'as it ships' } : null;
	});

/** Takes a template out of use, or back into it: no article can begin from it. */
export async function retireTemplate(
	ctx: Context,
	kind: string,
	{ version, retired }: TemplateRetire
): Promise<Written> {
	if (!may(ctx.actor, 'template.edit')) return onlyEditors();
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const before = await templateInUse(tx, kind);
			if (!before) return refuse('not_found', `There is no template “${kind}”.`);
			const { own } = before;
			if ((own?.version ?? 0) !== version) return changedMeanwhile('template', own?.version ?? 0);
			const id = own?.id ?? (await templates.insert(tx, kind));
			if (!own) await templates.addRevision(tx, rowOf(ctx, id, 1, before, 'as it ships'));
			const retiredAt = retired === 'yes' ? ctx.now : null;
			if (!(await templates.update(tx, id, own?.version ?? 1, { retiredAt })))
				return changedMeanwhile('template', version);
			await audit.append(tx, [said(ctx, 'template.retire', id, { kind, retiredAt })]);
			return done({ kind });
		});
	} catch (error) {
		if (isDuplicate(error)) return changedMeanwhile('template', 1);
		throw error;
	}
}
