import { archiveCampaign } from '../../services/bench/edit-campaign';
import * as facts from '../../db/queries/campaign-facts';
import * as campaigns from '../../db/queries/campaign';
import type { Act, World } from '../act';
import type { Campaign } from './measured';

/** A loop with its fans at three speeds. */
export const loopFans: Campaign = {
	slug: 'brisk-360-fans',
	name: 'Brisk 360, three fan speeds',
	rig: 'n-12',
	purpose: 'How quiet the loop can be before the render slows down.',
	plannedOn: -19,
	plannedBy: 'Tomas',
	dueOn: -12,
	repeats: 5,
	stock: { 'heat-soak': 41, loudness: 1.92, 'tile-render': 35.1 },
	gains: {
		'fans-quiet': { 'heat-soak': -15, loudness: 131, 'tile-render': -0.3 },
		'fans-full': { 'heat-soak': 9.5, loudness: -57, 'tile-render': 0.2 }
	},
	way: 'file',
	sittings: [
		{ profile: 'stock', day: -18, who: 'Tomas' },
		{ profile: 'fans-quiet', day: -17, who: 'Tomas' },
		{ profile: 'fans-full', day: -16, who: 'Tomas' }
	],
	odd: { 'fans-quiet/loudness': { notes: 'The pump is what is left to hear.' } },
	signed: [{ day: -15, time: '09:00', who: 'Tomas' }]
};

/** A tower with one fan and with two. */
export const towerFans: Campaign = {
	slug: 'brisk-tower-14-second-fan',
	name: 'Brisk Tower 14, one fan or two',
	rig: 'm-4',
	purpose: 'What the second fan brings in degrees and costs in noise.',
	plannedOn: -42,
	plannedBy: 'Pelle',
	dueOn: -36,
	repeats: 5,
	stock: { 'heat-soak': 52, loudness: 1.34 },
	gains: { 'second-fan': { 'heat-soak': 6.4, loudness: -17 } },
	way: 'grid',
	sittings: [
		{ profile: 'stock', day: -39, who: 'Pelle' },
		{ profile: 'second-fan', day: -38, who: 'Pelle' }
	],
	odd: { 'second-fan/heat-soak': { notes: 'Same paste, cooler not taken off between the two.' } },
	signed: [{ day: -37, time: '11:00', who: 'Pelle' }]
};

/** What a sleep setting saves; its meter turned out to be wrong, and the campaign was put away. */
export const idle: Campaign = {
	slug: 'anvil-m-idle',
	name: 'Anvil M, idle draw',
	rig: 'm-4',
	purpose: 'What the deepest sleep setting saves at the wall.',
	plannedOn: -42,
	plannedBy: 'Pelle',
	dueOn: null,
	repeats: 5,
	stock: { 'idle-draw': 38.2 },
	gains: { 'deep-idle': { 'idle-draw': 17.2 } },
	way: 'grid',
	sittings: [
		{ profile: 'stock', day: -41, from: '08:40', who: 'Pelle' },
		{ profile: 'deep-idle', day: -41, from: '13:10', who: 'Pelle' }
	],
	signed: [{ day: -41, time: '16:40', who: 'Pelle' }]
};

/** Puts the idle campaign away once its article was withdrawn. */
export const idleArchived = ({ calendar }: World): Act => ({
	at: calendar.at(-24, '12:00'),
	who: 'Pelle',
	what: 'archive of the idle campaign',
	run: async (ctx) => {
		const id = await campaigns.idOf(ctx.db, idle.slug);
		const [plan] = id === undefined ? [] : await facts.plansOf(ctx.db, [id]);
		return archiveCampaign(ctx, idle.slug, { archived: 'yes', version: plan?.head.version ?? 0 });
	}
});
