import type { Role } from './roles';

/** What each role is for, in a line for those who give it. */
export const roleWords: Record<Role, string> = {
	tester: 'plans campaigns, enters readings, signs the data off',
	writer: 'drafts articles on campaigns',
	editor: 'reviews, approves, publishes, corrects; never an article of their own',
	liaison: 'partners, loans, embargoes and disclosures; reads no drafts and no unpublished results',
	admin: 'people, roles, settings and the audit log'
};
