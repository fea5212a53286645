import { z } from 'zod';
import { directions, headlines, workloadClasses } from '../domain/bench/words';
import { line, number, optionalSlug, paragraphs, unchosen, versionSeen } from './fields';
import { apiListing, listing } from './listing';

const workloadFields = {
	name: line(160).min(1, 'A workload needs a name.'),
	programVersion: line(80).default(''),
	/** How it is run: command, preset, scene. */
	settings: paragraphs(10_000).default(''),
	/** What is measured, such as time or throughput. */
	quantity: line(80).min(1, 'Say what is measured, such as time or throughput.'),
	unit: line(40).min(1, 'Say in which unit, such as s or frames/s.'),
	better: z.enum(directions, 'Say which way is better.'),
	class: z.enum(workloadClasses, 'Choose the class of load.'),
	warmUps: number({ min: 0, max: 1000, decimals: 0 }).default(1),
	repeats: number({ min: 1, max: 1000, decimals: 0 }).default(5),
	/** Seconds between runs. */
	coolDownS: number({ min: 0, max: 86_400, decimals: 0 }).default(0),
	/** Least difference that matters, in percent. */
	leastDifferencePercent: number({ min: 0, max: 100, decimals: 3, open: true }),
	headline: z.enum(headlines, 'Choose mean or median.').default('mean')
};

/** A thing that is run, with its protocol. */
export const workloadInput = z.object({ ...workloadFields, slug: optionalSlug });
export type WorkloadInput = z.output<typeof workloadInput>;
export type WorkloadTyped = z.input<typeof workloadInput>;

export const workloadEdit = z.object({ ...workloadFields, version: versionSeen });
export type WorkloadEdit = z.output<typeof workloadEdit>;
export type WorkloadEditTyped = z.input<typeof workloadEdit>;

export const blankWorkload = (): WorkloadTyped => ({
	name: '',
	slug: '',
	programVersion: '',
	settings: '',
	quantity: '',
	unit: '',
	better: unchosen(),
	class: unchosen(),
	warmUps: '1',
	repeats: '5',
	coolDownS: '0',
	leastDifferencePercent: '1',
	headline: 'mean'
});

/** What the list of workloads takes from its address. */
export const workloadsQuery = listing(['name', 'class', 'newest']).extend({
	class: z.enum(workloadClasses).optional()
});
export type WorkloadsQuery = z.output<typeof workloadsQuery>;

/** A form for the next version of a workload: all as it was, under a name of its own. */
export function nextVersion({ slug, ...before }: WorkloadInput): WorkloadTyped {
	const [, stem = slug, number] = /^(.*?)(?:-v(\d+))?$/.exec(slug) ?? [];
	return {
		...asTyped(before),
		slug: `${stem.slice(0, 74).replace(/-+$/, '')}-v${Number(number ?? 1) + 1}`
	};
}

/** A stored workload as its form shows it. */
export const asTyped = (stored: Omit<WorkloadInput, 'slug'>) => ({
	name: stored.name,
	programVersion: stored.programVersion,
	settings: stored.settings,
	quantity: stored.quantity,
	unit: stored.unit,
	better: stored.better,
	class: stored.class,
	warmUps: String(stored.warmUps),
	repeats: String(stored.repeats),
	coolDownS: String(stored.coolDownS),
	leastDifferencePercent: String(stored.leastDifferencePercent),
	headline: stored.headline
});

export const workloadsApiQuery = apiListing.extend({ class: z.enum(workloadClasses).optional() });
export type WorkloadsApiQuery = z.output<typeof workloadsApiQuery>;
