import { may } from './policy';
import type { Actor } from './roles';

/** Where a person lands after sign-in. @example homeOf(liaison) // '/partners' */
export function homeOf(actor: Actor): string {
	if (may(actor, 'article.read')) return '/desk';
	return may(actor, 'partner.read') ? '/partners' : '/me';
}
