import type { Actor, Role, Scope } from './roles';

interface Rule {
	/** Roles of which one is enough. */
	roles: readonly Role[];
	/** Also allowed to the author of the article in question, whatever else they are. */
	author?: 'also' | 'only' | 'never';
	/** The scope a personal token must carry; acts without one are for people, not for scripts. */
	scope?: Scope;
}

const staff: readonly Role[] = ['tester', 'writer', 'editor', 'liaison', 'admin'];
const desk: readonly Role[] = ['tester', 'writer', 'editor', 'admin'];

/** Who may do what, as an editor could read it aloud. The liaison stands outside the copy and the unpublished results. */
export const policy = {
	'account.use': { roles: staff },

	'bench.read': { roles: desk, scope: 'bench:read' },
	'bench.plan': { roles: ['tester'], scope: 'bench:write' },
	'run.record': { roles: ['tester'], scope: 'bench:write' },
	'run.void': { roles: ['tester'], scope: 'bench:write' },
	'reading.exclude': { roles: ['tester'], scope: 'bench:write' },
	'cell.sign': { roles: ['tester'] },

	'stores.read': { roles: staff, scope: 'stores:read' },
	'stores.edit': { roles: ['tester', 'liaison'], scope: 'stores:write' },
	'partner.read': { roles: ['liaison'] },
	'partner.edit': { roles: ['liaison'] },
	'loan.read': { roles: ['liaison'] },
	'loan.edit': { roles: ['liaison'] },
	'loan.duties': { roles: ['liaison', 'editor', 'writer'] },
	'usage.read': { roles: ['liaison', 'editor', 'writer', 'tester'] },

	'picture.store': { roles: ['tester', 'writer', 'editor'], scope: 'pictures:write' },

	'article.read': { roles: desk },
	'article.create': { roles: ['writer', 'editor'] },
	'article.edit': { roles: ['editor'], author: 'also' },
	'article.submit': { roles: ['editor'], author: 'also' },
	'article.comment': { roles: ['tester', 'writer', 'editor'] },
	'article.resolve': { roles: ['editor'], author: 'also' },
	'article.ask-changes': { roles: ['editor'], author: 'never' },
	'article.approve': { roles: ['editor'], author: 'never' },
	'article.schedule': { roles: ['editor'] },
	'article.publish': { roles: ['editor'] },
	'article.correct': { roles: ['editor'] },
	'article.withdraw': { roles: ['editor'] },
	'article.check': { roles: ['tester', 'editor'] },
	'glossary.edit': { roles: ['writer', 'editor'] },
	'template.edit': { roles: ['editor'] },

	'people.read': { roles: staff },
	'people.manage': { roles: ['admin'] },
	'settings.manage': { roles: ['admin'] },
	'audit.read': { roles: ['admin'] },
	'jobs.manage': { roles: ['admin'] }
} as const satisfies Record<string, Rule>;

export type Act = keyof typeof policy;

/** What an act is done to, as far as permission depends on it. */
export interface Subject {
	authorId?: string;
}

/**
 * Whether an actor may do an act to a subject. Roles add up; the author's rule is applied after them,
 * so that no combination of roles lets anybody approve an article of their own.
 * @example may(actor, 'article.approve', { authorId: article.authorId })
 */
export function may(actor: Actor | null | undefined, act: Act, subject: Subject = {}): boolean {
	if (!actor) return false;
	const rule: Rule = policy[act];
	if (actor.scopes && (!rule.scope || !actor.scopes.includes(rule.scope))) return false;
	const isAuthor = subject.authorId !== undefined && subject.authorId === actor.id;
	if (rule.author === 'never' && isAuthor) return false;
	if (rule.author === 'only') return isAuthor;
	if (rule.author === 'also' && isAuthor && actor.roles.length > 0) return true;
	return rule.roles.some((role) => actor.roles.includes(role));
}
