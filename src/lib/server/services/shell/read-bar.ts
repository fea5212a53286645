import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import type { Role } from '../../../domain/people/roles';
import type { OpenContext } from '../../context';
import { loansDue, openCampaigns, waitingArticles } from '../../db/queries/bar-counts';
import { publication, type Publication } from '../../db/queries/settings';

/** What the staff's bar shows beside a place; a place that the roles cannot open has no count. */
export interface BarCounts {
	desk?: number;
	bench?: number;
	partners?: number;
}

export interface Bar {
	publication: Publication;
	person: { name: string; roles: readonly Role[] } | null;
	counts: BarCounts;
}

/** What frames every staff screen: the publication, who is here, and what waits in each place. */
export async function readBar({ db, actor, now }: OpenContext): Promise<Bar> {
	const named = publication(db);
	if (!actor) return { publication: await named, person: null, counts: {} };
	const { zone } = await named;
	const today = DateTime.fromJSDate(now).setZone(zone).toISODate() ?? '';
	const [desk, bench, partners] = await Promise.all([
		may(actor, 'article.read') ? waitingArticles(db, actor.id, may(actor, 'article.schedule')) : undefined,
		may(actor, 'bench.read') ? openCampaigns(db) : undefined,
		may(actor, 'loan.read') ? loansDue(db, today) : undefined
	]);
	return {
		publication: await named,
		person: { name: actor.name, roles: actor.roles },
		counts: { desk, bench, partners }
	};
}
