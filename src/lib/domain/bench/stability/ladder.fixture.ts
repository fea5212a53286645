import { attempt } from './attempt.fixture';
import type { LadderFacts } from './ladder-facts';

/** A ladder for the tests, with the attempts given. */
export const ladderOf = (attempts: LadderFacts['attempts']): LadderFacts => ({
	slug: 'by-hand',
	name: 'By hand',
	rig: { slug: 'n-12', name: 'N-12', revision: 1 },
	profile: { slug: 'stock', name: 'Stock' },
	stepMHz: 25,
	limits: { clockMHz: 5200, volts: 1.3, tempC: 90, source: 'the maker’s data sheet' },
	stresses: [
		{ slug: 'long-sums', name: 'Long sums', kind: 'heaviest', minutes: 30 },
		{ slug: 'tile-render', name: 'Tile render', kind: 'everyday', minutes: 20 }
	],
	attempts
});

/** Powers that lie on 40 W + 22 W · V²·GHz exactly, by hand. */
export const onALine = [
	{ clockMHz: 4700, volts: 1.1 },
	{ clockMHz: 4800, volts: 1.2 },
	{ clockMHz: 4900, volts: 1.25 }
].map(({ clockMHz, volts }) =>
	attempt({ clockMHz, volts, packageW: 40 + (22 * volts ** 2 * clockMHz) / 1000 })
);
