import { describe, expect, it } from 'vitest';
import { admits } from '../../../../tests/support/access-table';
import { may, policy, type Act } from './policy';
import { roles, scopes, type Actor, type Role } from './roles';

const acts = Object.keys(policy) as Act[];
const actor = (held: readonly Role[], more: Partial<Actor> = {}): Actor => ({
	id: 'me',
	name: 'Me',
	email: 'me@northlight.example',
	roles: held,
	...more
});
const own = { authorId: 'me' };
const foreign = { authorId: 'somebody else' };

describe.each(acts)('%s', (act) => {
	const allowed = admits[act].split(' ');

	it.each(roles)('by a %s is as the table says', (role) => {
		expect(may(actor([role]), act, foreign)).toBe(allowed.includes(role));
		const ownWork = allowed.includes('author') || (allowed.includes(role) && !allowed.includes('not-author'));
		expect(may(actor([role]), act, own)).toBe(ownWork);
	});

	it('is closed to a visitor and to somebody without a role', () => {
		expect(may(null, act)).toBe(false);
		expect(may(actor([]), act, own)).toBe(false);
	});

	it('is closed to a token without its scope, and opens no more than the roles do', () => {
		for (const role of roles) {
			expect(may(actor([role], { scopes: [] }), act, own)).toBe(false);
			const all = actor([role], { scopes });
			expect(may(all, act, foreign)).toBe('scope' in policy[act] && allowed.includes(role));
		}
	});
});

describe('the own-article rule', () => {
	it('holds for every combination of roles', () => {
		const combinations = Array.from({ length: 2 ** roles.length }, (_, bits) =>
			roles.filter((_, i) => (bits >> i) & 1)
		);
		for (const held of combinations)
			expect(may(actor(held), 'article.approve', own), held.join()).toBe(false);
	});
});

describe('the wall between money and copy', () => {
	it('keeps a liaison from drafts and unpublished results', () => {
		const acts: Act[] = ['article.read', 'article.comment', 'bench.read', 'run.record'];
		for (const act of acts) expect(may(actor(['liaison']), act), act).toBe(false);
	});
});
