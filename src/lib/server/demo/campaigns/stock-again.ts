import { campaignInput } from '../../../schemas/campaign';
import { runInput } from '../../../schemas/run';
import { planCampaign } from '../../services/bench/plan-campaign';
import { recordRun } from '../../services/bench/record-run';
import type { Act, World } from '../act';
import { readingsAround, seeded } from '../noise';
import { workloadFacts } from '../workloads';

const slug = 'n-12-stock-over-time';

/** Days on which stock was measured again, and by how many percent the rig was slower than it should be. */
const days: [day: number, slowerPercent: number][] = [
	[-43, 0],
	[-42, 0],
	[-41, 0],
	[-39, 0],
	[-37, 0],
	[-35, 0],
	[-32, 0],
	[-29, 0],
	[-27, 0],
	[-25, 0],
	[-22, 0],
	[-20, 0],
	// The pump was at its lowest speed after a change of the loop, and nobody had noticed.
	[-14, 1.7],
	[-12, 1.9],
	[-10, 1.6],
	[-8, 0],
	[-7, 0],
	[-6, 0]
];
/** What stock measures, in seconds. */
const stock: Record<string, number> = { 'tile-render': 35.1, 'prime-sieve': 24.6 };

function runOf({ calendar }: World, day: number, workload: string, mean: number, at: string): Act {
	const { cvPercent, decimals, unit } = workloadFacts(workload);
	const started = calendar.at(day, at);
	// A rig is never quite the same from one day to the next.
	const daily = 1 + 0.006 * (seeded(`${slug}/${workload}/${day}/daily`)() - 0.5);
	const readings = readingsAround(`${slug}/${workload}/${day}`, {
		mean: mean * daily,
		cvPercent,
		decimals,
		n: 5
	});
	return {
		at: new Date(started.getTime() + 20 * 60_000),
		who: 'Tomas',
		what: `stock of ${workload} again on day ${day}`,
		run: (ctx) =>
			recordRun(
				ctx,
				slug,
				runInput.parse({
					profile: 'stock',
					workload,
					readings,
					unit,
					ambientC: 21.2,
					startedAt: started.toISOString(),
					notes: ''
				})
			)
	};
}

/** Stock on the main rig, again and again, with a stretch in which the rig had moved. */
export const stockAgain = (world: World): Act[] => [
	{
		at: world.calendar.at(-44, '17:10'),
		who: 'Tomas',
		what: `campaign ${slug}`,
		run: (ctx) =>
			planCampaign(
				ctx,
				campaignInput.parse({
					slug,
					name: 'Rig N-12, stock over time',
					rig: 'n-12',
					purpose:
						'Stock every few days, so that a rig that moves is noticed before its figures are printed.',
					dueOn: '',
					profiles: ['stock'],
					workloads: Object.keys(stock).map((workload) => ({ workload, repeats: days.length * 5 }))
				})
			)
	},
	...days.flatMap(([day, slower]) => [
		runOf(world, day, 'tile-render', (stock['tile-render'] ?? 0) * (1 + slower / 100), '07:40'),
		runOf(world, day, 'prime-sieve', stock['prime-sieve'] ?? 0, '08:10')
	])
];
