import { expect, it } from 'vitest';
import { homeOf } from './home';
import { roles } from './roles';
import { scopesOf } from './token-scopes';
import { isZone } from './zone';

it('offers a role the scopes that can do something for it', () => {
	expect(scopesOf(['tester'])).toEqual([
		'bench:read',
		'bench:write',
		'stores:read',
		'stores:write',
		'pictures:write'
	]);
	expect(scopesOf(['writer'])).toEqual(['bench:read', 'stores:read', 'pictures:write']);
	expect(scopesOf(['liaison'])).toEqual(['stores:read', 'stores:write']);
	expect(scopesOf([])).toEqual([]);
});

it('sends everybody to a place of their own', () => {
	const homes = roles.map((role) => homeOf({ id: 'x', name: 'X', email: 'x@x.example', roles: [role] }));
	expect(homes).toEqual(['/desk', '/desk', '/desk', '/partners', '/desk']);
});

it.each([
	['Europe/Oslo', true],
	['UTC', true],
	['America/Argentina/Ushuaia', true],
	['+02:00', false],
	['Mars/Olympus', false],
	['', false]
])('knows whether %j is a time zone', (name, is) => {
	expect(isZone(name)).toBe(is);
});
