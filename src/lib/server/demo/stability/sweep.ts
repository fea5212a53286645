import { sweepPassInput } from '../../../schemas/stability';
import { sweepPlan } from '../../../schemas/sweep';
import { createSweep } from '../../services/stability/create-sweep';
import { recordPasses } from '../../services/stability/record-passes';
import type { Act, World } from '../act';

const slug = 'aldermoor-1650-switch';

type Point = [threads: number, currentA: number, clockMHz: number];

const passes: { time: string; ambientC: number; points: Point[] }[] = [
	{
		time: '13:10',
		ambientC: 21.1,
		points: [
			[1, 14.1, 5550],
			[2, 22.8, 5500],
			[4, 38.2, 5375],
			[6, 52.4, 5225],
			[8, 65.7, 5080],
			[10, 75.8, 4985],
			[12, 83.8, 4910],
			[16, 98.1, 4800],
			[24, 118.4, 4675],
			[32, 133.9, 4590]
		]
	},
	{
		time: '13:40',
		ambientC: 21.3,
		points: [
			[1, 13.9, 5550],
			[2, 23.1, 5500],
			[4, 38.0, 5380],
			[6, 52.1, 5230],
			[8, 66.1, 5070],
			[10, 76.0, 4985],
			[12, 84.0, 4910],
			[16, 98.4, 4795],
			[24, 118.1, 4680],
			[32, 134.3, 4585]
		]
	},
	{
		time: '14:10',
		ambientC: 21.4,
		points: [
			[1, 14.0, 5550],
			[2, 23.0, 5500],
			[4, 38.5, 5370],
			[6, 52.0, 5235],
			[8, 66.0, 5075],
			[10, 76.2, 4986],
			[12, 84.3, 4908],
			[16, 97.9, 4805],
			[24, 118.6, 4670],
			[32, 134.0, 4590]
		]
	}
];

/** The sweep behind the profile that changes over at 78 A. */
export const sweepActs = ({ calendar }: World): Act[] => [
	{
		at: calendar.at(-43, '13:00'),
		who: 'Tomas',
		what: `sweep ${slug}`,
		run: (ctx) =>
			createSweep(
				ctx,
				sweepPlan.parse({
					slug,
					name: 'Aldermoor 1650, where to change over',
					rig: 'n-12',
					profile: 'automatic-boost',
					workload: 'tile-render',
					purpose: 'From which current on the fixed 4.95 GHz is faster than what the board does by itself.',
					wantedClockMhz: 4950,
					currentStepA: 1
				})
			)
	},
	...passes.map(({ time, ambientC, points }, index): Act => {
		const began = calendar.at(-43, time);
		return {
			at: new Date(began.getTime() + 25 * 60_000),
			who: 'Tomas',
			what: `pass ${index + 1} of ${slug}`,
			run: (ctx) =>
				recordPasses(ctx, slug, [
					sweepPassInput.parse({
						points: points.map(([threads, currentA, clockMHz]) => ({ threads, currentA, clockMHz })),
						ambientC,
						startedAt: began.toISOString()
					})
				])
		};
	})
];
