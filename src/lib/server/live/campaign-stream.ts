import type { RequestEvent } from '@sveltejs/kit';
import type { BoardChange } from '../../domain/bench/live-words';
import { stillMay } from '../auth/still-signed-in';
import type { CampaignEvent } from '../db/queries/live';
import { eventStream } from '../http/event-stream';
import { campaignHub } from './campaign-hub';

const told =
	(me: string) =>
	({ id, act, actorId, who, cell, readings }: CampaignEvent): BoardChange => ({
		id,
		who: who ?? 'Calipress',
		mine: actorId === me,
		act,
		cell: cell ?? '',
		readings
	});

/** What happens in a campaign after an entry of its history, as it happens, while the session stands. */
export const campaignStream = (
	event: RequestEvent,
	me: string,
	{ campaign, after }: { campaign: number; after: number }
): Response =>
	eventStream(
		({ send, end }) =>
			campaignHub().watch(
				campaign,
				after,
				(events) => send({ event: 'change', id: events.at(-1)?.id ?? after, data: events.map(told(me)) }),
				end
			),
		{ stillAllowed: () => stillMay(event, 'bench.read') }
	);
