import { gridInput } from '../../../schemas/run';
import { excludeReading } from '../../services/bench/count-reading';
import { recordGridReadings } from '../../services/bench/record-grid-readings';
import { voidRun } from '../../services/bench/void-run';
import { kept, type Act, type World } from '../act';
import { readingsOf, type Campaign } from './measured';

const latencies = 'rated-6000/memory-latency';
const stockBuild = 'stock/source-build';

/** One kit at its base rate, its rated rate, by hand, and past what the controller can follow. */
export const memoryRates: Campaign = {
	slug: 'pennon-6000-rates',
	name: 'Pennon 6000, four rates',
	rig: 'm-4',
	purpose:
		'What the rated profile brings over the base rate, what an evening by hand brings over that, and whether more transfers at half the controller clock are worth having.',
	plannedOn: -20,
	plannedBy: 'Pelle',
	dueOn: -10,
	repeats: 5,
	stock: {
		'memory-copy': 58.4,
		'memory-latency': 93.5,
		'source-build': 402,
		'archive-pack': 451,
		'frame-walk': 128
	},
	gains: {
		'rated-6000': {
			'memory-copy': 21.5,
			'memory-latency': 13.4,
			'source-build': 3.4,
			'archive-pack': 6.3,
			'frame-walk': 5.2
		},
		'by-hand-6000': {
			'memory-copy': 26,
			'memory-latency': 25.1,
			'source-build': 5.3,
			'archive-pack': 10.1,
			'frame-walk': 9
		},
		'half-6800': {
			'memory-copy': 29.5,
			'memory-latency': 2.6,
			'source-build': 1.9,
			'archive-pack': 3,
			'frame-walk': 0.4
		}
	},
	way: 'grid',
	sittings: [
		{ profile: 'stock', day: -18, who: 'Pelle' },
		{ profile: 'rated-6000', day: -17, who: 'Pelle' },
		{ profile: 'by-hand-6000', day: -16, who: 'Pelle' },
		{ profile: 'half-6800', day: -15, who: 'Pelle' }
	],
	odd: {
		[latencies]: {
			n: 6,
			off: { 3: 1.094 },
			notes: 'Six taken: the fourth fell into an update of the system.'
		},
		[stockBuild]: { n: 6, off: { 0: 1.062 }, notes: 'The first is the warm-up and should not be here.' },
		'half-6800/source-build': { n: 3, notes: 'Stopped after the third build.' }
	},
	signed: [{ day: -13, time: '09:40', who: 'Pelle' }]
};

const answerOf = (world: World, cell: string) => kept(world.runs, `${memoryRates.slug}/${cell}`);

function excluded(world: World, cell: string, at: number, reason: string): Act {
	return {
		at: world.calendar.at(-14, '08:55'),
		who: 'Pelle',
		what: `exclusion in ${cell}`,
		run: (ctx) =>
			excludeReading(ctx, memoryRates.slug, { reading: answerOf(world, cell).stored[at]?.id ?? 0, reason })
	};
}

function voided(world: World): Act {
	return {
		at: world.calendar.at(-14, '09:05'),
		who: 'Pelle',
		what: 'void of a run',
		run: (ctx) =>
			voidRun(ctx, memoryRates.slug, {
				run: answerOf(world, 'half-6800/source-build').run ?? 0,
				reason: 'The memory voltage had not taken after the restart; the third build ended in an error.'
			})
	};
}

function again(world: World): Act {
	const [profile, workload] = ['half-6800', 'source-build'];
	const full = { ...memoryRates, odd: {} };
	return {
		at: world.calendar.at(-14, '11:50'),
		who: 'Pelle',
		what: 'the run measured again',
		run: (ctx) =>
			recordGridReadings(
				ctx,
				memoryRates.slug,
				gridInput.parse({
					profile,
					workload,
					unit: 's',
					runKey: 'demo-pennon-half-build-again',
					ambientC: 21.2,
					startedAt: world.calendar.at(-14, '09:40').toISOString(),
					notes: 'Voltage read back before each build.',
					readings: readingsOf(full, profile, workload).map((value, index) => ({
						key: `demo-pennon-half-build-again-${index}`,
						value
					}))
				})
			)
	};
}

/** What was put right before the signature: two readings excluded, a run voided and measured again. */
export const memoryMended = (world: World): Act[] => [
	excluded(world, latencies, 3, 'An update of the system ran; its log says so to the second.'),
	excluded(world, stockBuild, 0, 'The warm-up, entered by mistake.'),
	voided(world),
	again(world)
];
