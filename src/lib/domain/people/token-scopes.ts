import { policy } from './policy';
import { scopes, type Role, type Scope } from './roles';

/** The scopes that can do something for these roles; a token with others would be refused everywhere. */
export const scopesOf = (held: readonly Role[]): Scope[] =>
	scopes.filter((scope) =>
		Object.values(policy).some(
			(rule) => 'scope' in rule && rule.scope === scope && rule.roles.some((role) => held.includes(role))
		)
	);

export const scopeWords: Record<Scope, string> = {
	'bench:read': 'read workloads, rigs, profiles, campaigns and figures',
	'bench:write': 'plan campaigns and send readings',
	'stores:read': 'read parts and samples',
	'stores:write': 'add and change parts and samples',
	'pictures:write': 'put pictures in for articles'
};
