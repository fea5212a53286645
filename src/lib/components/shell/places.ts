import { may, type Act } from '../../domain/people/policy';
import type { Role } from '../../domain/people/roles';

export interface Person {
	name: string;
	roles: readonly Role[];
}

interface Place {
	label: string;
	href: string;
	/** The act that opens it. */
	act: Act;
	/** Which of the bar's counts belongs to it. */
	count?: 'desk' | 'bench' | 'partners';
}

/** The five places of the bar. */
export const places: readonly Place[] = [
	{ label: 'Desk', href: '/desk', act: 'article.read', count: 'desk' },
	{ label: 'Bench', href: '/bench', act: 'bench.read', count: 'bench' },
	{ label: 'Stores', href: '/stores', act: 'stores.read' },
	{ label: 'Partners', href: '/partners', act: 'partner.read', count: 'partners' },
	{ label: 'People', href: '/people', act: 'people.read' }
];

/** What a count means, for those who hear it without seeing where it stands. */
export const countWords = {
	desk: 'waiting',
	bench: 'under way',
	partners: 'due back'
} as const;

export interface Command {
	label: string;
	href: string;
	group: 'Go to' | 'Do';
	/** Other words it is found by. */
	keywords?: string[];
	act: Act;
}

export const commands: readonly Command[] = [
	...places.map(({ label, href, act }) => ({ label, href, act, group: 'Go to' as const })),
	{
		group: 'Go to',
		label: 'Articles',
		href: '/desk/articles',
		act: 'article.read',
		keywords: ['drafts', 'search', 'tags']
	},
	{ group: 'Go to', label: 'Workloads', href: '/bench/workloads', act: 'bench.read', keywords: ['bench'] },
	{ group: 'Go to', label: 'Rigs', href: '/bench/rigs', act: 'bench.read', keywords: ['bench', 'profiles'] },
	{ group: 'Go to', label: 'Suites', href: '/bench/suites', act: 'bench.read', keywords: ['bench', 'lab'] },
	{
		group: 'Go to',
		label: 'Instruments',
		href: '/bench/instruments',
		act: 'bench.read',
		keywords: ['bench', 'lab', 'calibration']
	},
	{ group: 'Go to', label: 'Limits', href: '/bench/limits', act: 'bench.read', keywords: ['bench', 'lab'] },
	{
		group: 'Go to',
		label: 'Firmware meanings',
		href: '/bench/meanings',
		act: 'bench.read',
		keywords: ['bench', 'lab', 'settings', 'family']
	},
	{
		group: 'Go to',
		label: 'Glossary',
		href: '/desk/glossary',
		act: 'article.read',
		keywords: ['terms', 'words']
	},
	{
		group: 'Go to',
		label: 'Templates',
		href: '/desk/templates',
		act: 'article.read',
		keywords: ['checklist']
	},
	{ group: 'Go to', label: 'My page', href: '/me', act: 'account.use', keywords: ['password', 'tokens'] },
	{ group: 'Go to', label: 'The readers’ site', href: '/', act: 'account.use', keywords: ['home', 'public'] },
	{ group: 'Go to', label: 'Mail and jobs', href: '/people/jobs', act: 'jobs.manage', keywords: ['outbox'] },
	{ group: 'Go to', label: 'Audit log', href: '/people/audit', act: 'audit.read', keywords: ['history'] },
	{ group: 'Go to', label: 'Settings', href: '/people/settings', act: 'settings.manage', keywords: ['zone'] },
	{ group: 'Do', label: 'Start an article', href: '/desk/new', act: 'article.create', keywords: ['new'] },
	{
		group: 'Do',
		label: 'Plan a campaign',
		href: '/bench/campaigns/new',
		act: 'bench.plan',
		keywords: ['new']
	}
];

/** Whether somebody with these roles can do an act at all. */
export const can = (roles: readonly Role[], act: Act): boolean =>
	may({ id: '', name: '', email: '', roles }, act);
