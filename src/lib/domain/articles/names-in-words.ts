import type { ArticleData } from './data';

const kinds: Record<string, string> = {
	scores: 'one workload, a bar for each profile',
	gains: 'every workload over a profile',
	overall: 'the mean of all workloads',
	value: 'score for power or price',
	'trade-off': 'what is gained and given up',
	drift: 'stock over time',
	ladder: 'attempts over rising settings',
	sweep: 'current and clock over threads',
	signed: 'with its sign',
	size: 'without its sign',
	words: 'as faster or slower',
	ratio: 'as a ratio',
	interval: 'its 95 % interval',
	mean: 'the average',
	median: 'the middle reading',
	changed: 'what differs from stock',
	all: 'every setting'
};

const nameOf = (items: readonly { slug: string; name: string }[], slug: string): string | undefined =>
	items.find((one) => one.slug === slug)?.name;

/** What a name that an attribute takes stands for, in a few words; empty where the name says it. */
export function nameInWords(attribute: string, name: string, data: ArticleData): string {
	const { campaigns } = data;
	switch (attribute) {
		case 'workload': {
			const workload = campaigns.flatMap((one) => one.workloads).find((one) => one.slug === name);
			return workload ? `${workload.name}, ${workload.unit}, ${workload.class}` : '';
		}
		case 'profile':
		case 'profiles':
		case 'over':
		case 'subject':
			return (
				nameOf(
					campaigns.flatMap((one) => one.profiles),
					name
				) ?? ''
			);
		case 'campaign':
			return nameOf(campaigns, name) ?? '';
		case 'rig':
			return (
				nameOf(
					campaigns.map((one) => one.rig),
					name
				) ?? ''
			);
		case 'ladder':
			return nameOf(data.ladders ?? [], name) ?? '';
		case 'sweep':
			return nameOf(data.sweeps ?? [], name) ?? '';
		case 'part':
			return campaigns.flatMap((one) => one.kit).find((one) => one.part === name)?.partName ?? '';
		default:
			return kinds[name] ?? '';
	}
}
