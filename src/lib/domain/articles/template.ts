/** What the items of a checklist are about, in the order they are gone through. */
export const checklistGroups = ['data', 'prose', 'pictures', 'law'] as const;
export type ChecklistGroup = (typeof checklistGroups)[number];

export const checklistGroupWords: Record<ChecklistGroup, string> = {
	data: 'Data',
	prose: 'Prose',
	pictures: 'Pictures',
	law: 'Law'
};

/** One thing to look at before an article of a template goes out. */
export interface ChecklistItem {
	group: ChecklistGroup;
	text: string;
}

/** A template an article can begin from. */
export interface ArticleTemplate {
	/** Its own name, which is also the kind of article it makes. */
	kind: string;
	/** What people call it. */
	name: string;
	/** What the title field holds at first. */
	title: string;
	standfirst: string;
	/** What it is for, in a sentence for the writer. */
	for: string;
	/** Its text, with names to be filled in (fillTemplate). */
	body: string;
	checklist: ChecklistItem[];
}

const isGroup = (word: string): word is ChecklistGroup =>
	(checklistGroups as readonly string[]).includes(word);

/** A checklist as lines for a text field. @example linesOfChecklist([{ group: 'data', text: 'All signed' }]) // 'data: All signed' */
export const linesOfChecklist = (items: readonly ChecklistItem[]): string =>
	items.map(({ group, text }) => `${group}: ${text}`).join('\n');

/**
 * A checklist from its lines, `data: …`, `prose: …`, `pictures: …` or `law: …` each; the same item counts once.
 * What cannot be read comes back as faults that name the line.
 */
export function checklistOfLines(text: string): { items: ChecklistItem[]; faults: string[] } {
	const items = new Map<string, ChecklistItem>();
	const faults: string[] = [];
	text.split('\n').forEach((line, at) => {
		if (line.trim() === '') return;
		const [, word = '', rest = ''] = /^\s*([a-z]+)\s*:\s*(.*?)\s*$/i.exec(line) ?? [];
		const group = word.toLowerCase();
		if (!isGroup(group) || rest === '')
			faults.push(
				`Line ${at + 1} does not say what it is about. Begin it with ${checklistGroups.join(':, ')}: and the words.`
			);
		else if (rest.length > 200) faults.push(`Line ${at + 1} is longer than 200 characters.`);
		else items.set(`${group}/${rest}`, { group, text: rest });
	});
	return { items: [...items.values()], faults };
}
