export const roles = ['tester', 'writer', 'editor', 'liaison', 'admin'] as const;
export type Role = (typeof roles)[number];

/** Who acts: identity, the roles that add up, and, when a token speaks for them, what the token allows. */
export interface Actor {
	id: string;
	name: string;
	email: string;
	roles: readonly Role[];
	/** Present when the request came with a personal token; absent for a signed-in browser. */
	scopes?: readonly Scope[];
}

export const scopes = ['bench:read', 'bench:write', 'stores:read', 'stores:write', 'pictures:write'] as const;
export type Scope = (typeof scopes)[number];
