import { workloadInput, type WorkloadTyped } from '../../schemas/workload';
import { createWorkload } from '../services/bench-plan/create-workload';
import type { Act, World } from './act';

/** How far readings of a workload lie from each other on a calm bench, and how many decimals its program prints. */
interface Scatter {
	cvPercent: number;
	decimals: number;
}

interface Entry extends Scatter {
	typed: WorkloadTyped;
}

const entry = (scatter: Scatter, typed: Omit<WorkloadTyped, 'slug'> & { slug: string }): Entry => ({
	...scatter,
	typed
});

const list: Entry[] = [
	entry(
		{ cvPercent: 0.35, decimals: 2 },
		{
			slug: 'prime-sieve',
			name: 'Prime sieve',
			programVersion: '3.1',
			settings:
				'sieve --limit 4e10 --threads 1\n\nOne thread, free to move between cores. Nothing else runs; the network cable is out.',
			quantity: 'time',
			unit: 's',
			better: 'lower',
			class: 'light-threaded',
			warmUps: 1,
			repeats: 7,
			coolDownS: 60,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.35, decimals: 2 },
		{
			slug: 'tile-render',
			name: 'Tile render',
			programVersion: '2.8',
			settings:
				'Scene “kitchen”, 1920 × 1080, tiles of 64, every thread.\n\nStart it from the command line, so that no window is drawn while it runs.',
			quantity: 'time',
			unit: 's',
			better: 'lower',
			class: 'all-core',
			warmUps: 1,
			repeats: 7,
			coolDownS: 120,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.45, decimals: 1 },
		{
			slug: 'source-build',
			name: 'Source build',
			programVersion: 'tree of 14 March',
			settings:
				'make -j, twice the number of threads, from a tree held in memory.\n\nThe first build of the day is thrown away: it fills the caches.',
			quantity: 'time',
			unit: 's',
			better: 'lower',
			class: 'all-core',
			warmUps: 1,
			repeats: 7,
			coolDownS: 120,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.45, decimals: 2 },
		{
			slug: 'video-encode',
			name: 'Video encode',
			programVersion: '1.6',
			settings:
				'Clip “harbour”, 4096 × 2160, preset slow, constant quality 22.\n\nOutput goes to memory, not to the drive.',
			quantity: 'rate',
			unit: 'frames/s',
			better: 'higher',
			class: 'all-core',
			warmUps: 1,
			repeats: 7,
			coolDownS: 120,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.5, decimals: 1 },
		{
			slug: 'archive-pack',
			name: 'Archive pack',
			programVersion: '9.2',
			settings: 'pack -9 of the folder “corpus”, 8 GB, read from memory, dictionary 256 MB.',
			quantity: 'throughput',
			unit: 'MB/s',
			better: 'higher',
			class: 'all-core',
			warmUps: 1,
			repeats: 7,
			coolDownS: 60,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.8, decimals: 1 },
		{
			slug: 'frame-walk',
			name: 'Frame walk',
			programVersion: '1.4',
			settings:
				'The recorded walk through the market, 1920 × 1080, preset high, no limit on frames.\n\nLoad the level afresh before each run; the first walk after a load is a warm-up.',
			quantity: 'average rate',
			unit: 'frames/s',
			better: 'higher',
			class: 'game',
			warmUps: 1,
			repeats: 7,
			coolDownS: 30,
			leastDifferencePercent: 3
		}
	),
	entry(
		{ cvPercent: 0.5, decimals: 1 },
		{
			slug: 'lantern-street',
			name: 'Lantern Street',
			programVersion: '2.0',
			settings: 'Built-in ride, 2560 × 1440, preset high, frame limit off, three minutes.',
			quantity: 'average rate',
			unit: 'frames/s',
			better: 'higher',
			class: 'game',
			warmUps: 1,
			repeats: 6,
			coolDownS: 60,
			leastDifferencePercent: 2
		}
	),
	entry(
		{ cvPercent: 0.35, decimals: 2 },
		{
			slug: 'memory-copy',
			name: 'Memory copy',
			programVersion: '0.9',
			settings: 'memwalk copy, blocks of 256 MB, every thread, best of nothing: the mean of ten seconds.',
			quantity: 'bandwidth',
			unit: 'GB/s',
			better: 'higher',
			class: 'memory',
			warmUps: 1,
			repeats: 5,
			coolDownS: 20,
			leastDifferencePercent: 1
		}
	),
	entry(
		{ cvPercent: 0.5, decimals: 1 },
		{
			slug: 'memory-latency',
			name: 'Memory latency',
			programVersion: '0.9',
			settings: 'memwalk chase, 512 MB, one thread, large pages on.',
			quantity: 'latency',
			unit: 'ns',
			better: 'lower',
			class: 'memory',
			warmUps: 1,
			repeats: 5,
			coolDownS: 20,
			leastDifferencePercent: 1.5,
			headline: 'median'
		}
	),
	entry(
		{ cvPercent: 0.8, decimals: 1 },
		{
			slug: 'heat-soak',
			name: 'Heat soak',
			programVersion: '1.2',
			settings:
				'Every thread in the heaviest loop for thirty minutes. What counts is the hottest core over the last five, less the air at the intake.',
			quantity: 'temperature over ambient',
			unit: 'K',
			better: 'lower',
			class: 'stress',
			warmUps: 0,
			repeats: 5,
			coolDownS: 1200,
			leastDifferencePercent: 3
		}
	),
	entry(
		{ cvPercent: 1.8, decimals: 2 },
		{
			slug: 'loudness',
			name: 'Loudness',
			programVersion: '',
			settings:
				'During the heat soak, half a metre in front of the rig, at night, in the quiet room. Sone, because twice the sone is twice as loud to the ear.',
			quantity: 'loudness',
			unit: 'sone',
			better: 'lower',
			class: 'stress',
			warmUps: 0,
			repeats: 5,
			coolDownS: 0,
			leastDifferencePercent: 8
		}
	),
	entry(
		{ cvPercent: 0.6, decimals: 1 },
		{
			slug: 'idle-draw',
			name: 'Idle draw',
			programVersion: '',
			settings: 'At the wall, desktop shown, nothing open, mean of ten minutes, ten minutes after the start.',
			quantity: 'power',
			unit: 'W',
			better: 'lower',
			class: 'light-threaded',
			warmUps: 0,
			repeats: 5,
			coolDownS: 0,
			leastDifferencePercent: 3
		}
	),
	entry(
		{ cvPercent: 0.7, decimals: 1 },
		{
			slug: 'render-draw',
			name: 'Draw under render',
			programVersion: '',
			settings: 'At the wall, during Tile render, mean of the run.',
			quantity: 'power',
			unit: 'W',
			better: 'lower',
			class: 'all-core',
			warmUps: 1,
			repeats: 5,
			coolDownS: 120,
			leastDifferencePercent: 2
		}
	),
	entry(
		{ cvPercent: 0.5, decimals: 3 },
		{
			slug: 'frame-energy',
			name: 'Energy of a frame',
			programVersion: '2.0',
			settings: 'During Lantern Street: what the card drew, by its own meter, over the frames it drew.',
			quantity: 'energy',
			unit: 'J',
			better: 'lower',
			class: 'game',
			warmUps: 1,
			repeats: 6,
			coolDownS: 60,
			leastDifferencePercent: 2
		}
	)
];

/** The workloads, all of them programs of our own invention. */
export const workloads = ({ calendar }: World): Act[] =>
	list.map(({ typed }, index): Act => ({
		at: calendar.at(-61, `13:${String(index + 10)}`),
		who: index % 3 === 2 ? 'Pelle' : 'Tomas',
		what: `workload ${typed.name}`,
		run: (ctx) => createWorkload(ctx, workloadInput.parse(typed))
	}));

/** A workload's unit, direction and scatter. RangeError for one the demo does not have. */
export function workloadFacts(slug: string): Scatter & Pick<WorkloadTyped, 'unit' | 'better'> {
	const found = list.find(({ typed }) => typed.slug === slug);
	if (!found) throw new RangeError(`The demo has no workload ${slug}.`);
	const { cvPercent, decimals, typed } = found;
	return { cvPercent, decimals, unit: typed.unit, better: typed.better };
}
