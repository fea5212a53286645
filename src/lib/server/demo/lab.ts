import { instrumentInput } from '../../schemas/instrument';
import { labLimitInput } from '../../schemas/lab-limit';
import { meaningInput } from '../../schemas/firmware-meaning';
import { suiteInput } from '../../schemas/suite';
import * as campaigns from '../db/queries/campaign';
import * as facts from '../db/queries/campaign-facts';
import { nameInstrument } from '../services/bench/name-instrument';
import { createInstrument } from '../services/bench-plan/create-instrument';
import { createLabLimit } from '../services/bench-plan/create-limit';
import { createMeaning } from '../services/bench-plan/create-meaning';
import { createSuite } from '../services/bench-plan/create-suite';
import type { Act, World } from './act';
import { idle } from './campaigns/cooling';

const suite = {
	name: 'Processors, short',
	purpose:
		'What every processor goes through in its first week: one program on one thread, three on all of them, and a game. About five hours for a profile.',
	workloads: [
		{ workload: 'prime-sieve', repeats: '7' },
		{ workload: 'tile-render', repeats: '7' },
		{ workload: 'source-build', repeats: '5' },
		{ workload: 'video-encode', repeats: '5' },
		{ workload: 'frame-walk', repeats: '7' }
	]
};

const instruments = ({ date }: World['calendar']) => [
	{
		slug: 'sallow-w2',
		name: 'Sallow W2',
		serial: 'SW2-00418',
		quantity: 'power at the wall',
		unit: 'W',
		accuracyPercent: '0.1',
		accuracyAbsolute: '0.2',
		resolution: '0.01',
		// It had read wrong in the idle campaign, and was mended since.
		calibratedOn: date(-20),
		calibrationDueOn: date(345),
		accuracySource: 'Certificate 2214, after it was mended'
	},
	{
		slug: 'wisp-probe',
		name: 'Wisp probe',
		serial: 'WP-77',
		quantity: 'temperature of the air',
		unit: '°C',
		accuracyPercent: '0',
		accuracyAbsolute: '0.3',
		resolution: '0.1',
		calibratedOn: date(-400),
		calibrationDueOn: date(-35),
		accuracySource: 'Manual, page 12'
	}
];

const limits = [
	[
		'core-voltage',
		'processor',
		'1.30',
		'V',
		'What we leave on overnight; above it a chip of ours aged within weeks.'
	],
	['power-limit', 'processor', '220', 'W', 'The socket grew warm to the hand at 240 W on the older board.'],
	['memory-voltage', 'memory', '1.45', 'V', 'The data sheet of the Pennon kit, page 4, less a margin.'],
	['temperature-limit', 'processor', '95', '°C', 'The board’s own limit; we have no reason to go beyond.']
].map(([quantity, partKind, limit, unit, source]) => ({ quantity, partKind, limit, unit, source }));

const meanings = [
	['Forge X', 'Automatic boost', 'automatic-boost'],
	['Anvil M', 'Row cycle time', 'row-cycle']
].map(([family, setting, quantity]) => ({ family, setting, quantity }));

const named = ({ calendar }: World): Act => ({
	at: calendar.at(idle.plannedOn, '16:25'),
	who: 'Pelle',
	what: 'instrument of the idle campaign',
	run: async (ctx) => {
		const id = await campaigns.idOf(ctx.db, idle.slug);
		const [plan] = id === undefined ? [] : await facts.plansOf(ctx.db, [id]);
		const version = plan?.head.version ?? 0;
		return nameInstrument(ctx, idle.slug, { workload: 'idle-draw', instrument: 'sallow-w2', version });
	}
});

/** The lab's own things: its standard suite, its instruments, its limits, and what firmware calls its settings. */
export const labActs = (world: World): Act[] => {
	const { calendar } = world;
	const act = (time: string, what: string, run: Act['run']): Act => ({
		at: calendar.at(-59, time),
		who: 'Tomas',
		what,
		run
	});
	return [
		act('09:40', 'suite', (ctx) => createSuite(ctx, suiteInput.parse(suite))),
		...instruments(calendar).map((typed, at) =>
			act(`10:1${at}`, `instrument ${typed.name}`, (ctx) =>
				createInstrument(ctx, instrumentInput.parse(typed))
			)
		),
		...limits.map((typed, at) =>
			act(`10:2${at}`, `limit of ${typed.quantity}`, (ctx) => createLabLimit(ctx, labLimitInput.parse(typed)))
		),
		...meanings.map((typed, at) =>
			act(`10:3${at}`, `meaning of ${typed.setting}`, (ctx) => createMeaning(ctx, meaningInput.parse(typed)))
		),
		named(world)
	];
};
