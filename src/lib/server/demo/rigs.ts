import { rigInput, rigRevise } from '../../schemas/rig';
import * as rigQueries from '../db/queries/rig';
import { createRig } from '../services/bench-plan/create-rig';
import { reviseRig } from '../services/bench-plan/revise-rig';
import type { Act, World } from './act';
import type { Who } from './staff';

interface Revision {
	day: number;
	who: Who;
	samples: string[];
	firmware: string;
	driver: string;
	os: string;
	/** What changed; not for the first. */
	change?: string;
}

const kitN = ['n-101', 'n-102', 'n-103', 'n-104', 'n-105', 'n-106', 'n-107', 'n-108'];
const kitM = ['m-201', 'm-202', 'm-203', 'm-204', 'm-205', 'm-206'];

/** What the firmware of each rig is, whatever its version. */
const families: Record<string, string> = { 'N-12': 'Forge X', 'M-4': 'Anvil M', 'G-2': 'Forge X' };

const rigs: Record<string, Revision[]> = {
	'N-12': [
		{
			day: -58,
			who: 'Tomas',
			samples: kitN,
			firmware: 'Forge X 2.08',
			driver: 'Marlow 41.2',
			os: 'Lab image 7'
		},
		{
			day: -46,
			who: 'Tomas',
			samples: kitN,
			firmware: 'Forge X 2.14',
			driver: 'Marlow 41.6',
			os: 'Lab image 7',
			change:
				'Firmware 2.14, which changes over by load current to one ampere instead of four. New graphics driver with it.'
		},
		{
			day: -5,
			who: 'Pelle',
			samples: kitN,
			firmware: 'Forge X 2.20',
			driver: 'Marlow 41.6',
			os: 'Lab image 7',
			change: 'Firmware 2.20. Everything else is as it was, so that the two can be held against each other.'
		}
	],
	'M-4': [
		{
			day: -45,
			who: 'Pelle',
			samples: kitM,
			firmware: 'Anvil M 1.31',
			driver: '',
			os: 'Lab image 7'
		},
		{
			day: -20,
			who: 'Pelle',
			samples: kitM.map((sample) => (sample === 'm-204' ? 'm-207' : sample)),
			firmware: 'Anvil M 1.31',
			driver: '',
			os: 'Lab image 7',
			change:
				'The lent cooler went back. A bought one of the same model is in its place, with the same paste.'
		}
	],
	'G-2': [
		{
			day: -13,
			who: 'Tomas',
			samples: ['g-301', 'g-303', 'g-304', 'g-305', 'g-306', 'g-302', 'g-307'],
			firmware: 'Forge X 2.14',
			driver: 'Marlow 42.0 preview',
			os: 'Lab image 7'
		}
	]
};

/** The three rigs; N-12 was revised twice. */
export const rigActs = ({ calendar }: World): Act[] =>
	Object.entries(rigs).flatMap(([name, revisions]) =>
		revisions.map(({ day, who, change, ...parts }): Act => ({
			at: calendar.at(day, '10:40'),
			who,
			what: `rig ${name}`,
			run: async (ctx) => {
				if (change === undefined)
					return createRig(ctx, rigInput.parse({ name, firmwareFamily: families[name], ...parts }));
				const slug = name.toLowerCase();
				const [rig] = await rigQueries.byRefs(ctx.db, [slug]);
				return reviseRig(ctx, slug, rigRevise.parse({ ...parts, change, version: rig?.version }));
			}
		}))
	);
