import type { ArticleTemplate } from '../../../domain/articles/template';
import type { Db } from '../../db/client';
import * as templates from '../../db/queries/article-template';
import { shippedTemplate, shippedTemplates } from '../../rendering/templates';

/** A template as it stands: the lab's newest revision of it, else the file that ships. */
export interface TemplateInUse extends ArticleTemplate {
	ships: boolean;
	/** Null where nobody has changed what ships. */
	own: { id: number; head: number; version: number; savedBy: string; savedAt: Date } | null;
	retired: boolean;
}

type Row = Awaited<ReturnType<typeof templates.all>>[number];

const ofRow = ({ id, head, version, savedBy, savedAt, retiredAt, ...template }: Row): TemplateInUse => ({
	...template,
	ships: shippedTemplate(template.kind) !== undefined,
	own: { id, head, version, savedBy, savedAt },
	retired: retiredAt !== null
});

const ofFile = (template: ArticleTemplate): TemplateInUse => ({
	...template,
	ships: true,
	own: null,
	retired: false
});

/** Every template, those that ship first, retired ones too. */
export async function templatesInUse(db: Db): Promise<TemplateInUse[]> {
	const own = (await templates.all(db)).map(ofRow);
	const shipped = shippedTemplates.map((file) => own.find(({ kind }) => kind === file.kind) ?? ofFile(file));
	return [...shipped, ...own.filter(({ ships }) => !ships)];
}

/** One template by its kind, retired or not; null where there is none. */
export async function templateInUse(db: Db, kind: string): Promise<TemplateInUse | null> {
	const [own] = await templates.all(db, [kind]);
	const file = shippedTemplate(kind);
	return own ? ofRow(own) : file ? ofFile(file) : null;
}
