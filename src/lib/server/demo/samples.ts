import { sampleInput, type SampleTyped } from '../../schemas/sample';
import { createSample } from '../services/stores/create-sample';
import type { Act, World } from './act';

type Row = [
	day: number,
	part: string,
	slug: string,
	serial: string,
	provenance: SampleTyped['provenance'],
	condition: string,
	place: string
];

const bench1 = 'Bench 1';
const bench2 = 'Bench 2';
const bench3 = 'Bench 3';
const shelf = 'Shelf B';

const rows: Row[] = [
	[-67, 'aldermoor-1650', 'n-101', 'AM16-004417', 'loaned', 'New, box opened by us', bench1],
	[-67, 'hollin-forge-x', 'n-102', 'HFX-22-0913', 'loaned', 'New, one scratch under the lower slot', bench1],
	[-66, 'pennon-6000-2-x-16-gb', 'n-103', 'P6-7719034', 'bought', 'New', bench1],
	[-66, 'brisk-360', 'n-104', 'B360-118-201', 'bought', 'New', bench1],
	[-66, 'marlow-g50', 'n-105', 'G50-30117', 'bought', 'Used two months in the office', bench1],
	[-66, 'tarn-s2-1-tb', 'n-106', 'TS2-88410', 'bought', 'New', bench1],
	[-66, 'ferrow-850', 'n-107', 'FR850-5521', 'bought', 'New', bench1],
	[-66, 'kestle-open-frame', 'n-108', '', 'bought', 'Six years old, complete', bench1],
	[-54, 'aldermoor-1430', 'm-201', 'AM14-019022', 'bought', 'New', bench2],
	[-54, 'hollin-anvil-m', 'm-202', 'HAM-21-4470', 'bought', 'New', bench2],
	[-54, 'pennon-6000-2-x-16-gb', 'm-203', 'P6-7720588', 'bought', 'New', bench2],
	[
		-53,
		'brisk-tower-14',
		'm-204',
		'BT14-00931',
		'loaned',
		'New; fins bent at one corner, photographed',
		bench2
	],
	[-54, 'tarn-s2-1-tb', 'm-205', 'TS2-90266', 'bought', 'New', bench2],
	[-54, 'ferrow-650', 'm-206', 'FR650-0382', 'bought', 'New', bench2],
	[-22, 'brisk-tower-14', 'm-207', 'BT14-02214', 'bought', 'New', bench2],
	[
		-25,
		'marlow-g70',
		'g-301',
		'G70-PP-0042',
		'pre-production',
		'Engineering sample, maker’s sticker on the plate',
		bench3
	],
	[-36, 'tarn-s4-2-tb', 'g-302', 'TS4-10077', 'given', 'New', bench3],
	[-20, 'aldermoor-1650', 'g-303', 'AM16-007730', 'bought', 'New', bench3],
	[-20, 'hollin-forge-x', 'g-304', 'HFX-22-2096', 'bought', 'New', bench3],
	[-20, 'pennon-5200-2-x-16-gb', 'g-305', 'P5-3301178', 'bought', 'New', bench3],
	[-20, 'brisk-tower-14', 'g-306', 'BT14-02219', 'bought', 'New', bench3],
	[-20, 'ferrow-850', 'g-307', 'FR850-7104', 'bought', 'New', bench3],
	[-39, 'lode-grey-4-g', 's-401', '', 'bought', 'Open, half used', shelf],
	[-9, 'marlow-g50', 's-402', 'G50-41820', 'loaned', '', 'On its way to us'],
	[-2, 'brisk-420', 's-403', '', 'loaned', '', 'Not here yet']
];

/** The units in the stores, each taken in on its day. */
export const samples = ({ calendar }: World): Act[] =>
	rows.map(([day, part, slug, serial, provenance, condition, place]): Act => ({
		at: calendar.at(day, '09:30'),
		who: day < -60 ? 'Pelle' : 'Jonas',
		what: `sample ${slug}`,
		run: (ctx) => createSample(ctx, sampleInput.parse({ part, slug, serial, provenance, condition, place }))
	}));
