import { partInput, priceInput, type PartTyped } from '../../schemas/part';
import { slugOf } from '../../domain/shared/slug';
import { addPartPrice } from '../services/stores/add-part-price';
import { createPart } from '../services/stores/create-part';
import type { Act, World } from './act';

type Kind = PartTyped['kind'];
type Spec = [name: string, value: string, unit?: string];
/** Days from today, amount and currency; the last is the newest. */
type Price = [day: number, amount: string, currency: 'EUR' | 'USD', source: string];

const part = (kind: Kind, maker: string, model: string, specification: Spec[], prices: Price[]) => ({
	kind,
	maker,
	model,
	specification: specification.map(([name, value, unit = '']) => ({ name, value, unit })),
	prices
});

const shop = 'Fjordkant, list price';
const other = 'Harbour & Sons, in stock';

const list = [
	part(
		'processor',
		'Aldermoor',
		'1650',
		[
			['Cores', '16'],
			['Threads', '32'],
			['Base clock', '4.4', 'GHz'],
			['Boost clock, one core', '5.25', 'GHz'],
			['Cache, third level', '64', 'MB'],
			['Power limit', '170', 'W'],
			['Temperature limit', '90', '°C']
		],
		[
			[-120, '729.00', 'USD', other],
			[-70, '709.00', 'EUR', shop],
			[-21, '689.00', 'EUR', shop]
		]
	),
	part(
		'processor',
		'Aldermoor',
		'1430',
		[
			['Cores', '8'],
			['Threads', '16'],
			['Base clock', '4.2', 'GHz'],
			['Boost clock, one core', '5.05', 'GHz'],
			['Cache, third level', '32', 'MB'],
			['Power limit', '88', 'W'],
			['Temperature limit', '90', '°C']
		],
		[
			[-110, '349.00', 'USD', other],
			[-60, '329.00', 'EUR', shop],
			[-14, '309.00', 'EUR', shop]
		]
	),
	part(
		'board',
		'Hollin',
		'Forge X',
		[
			['Phases, core', '18'],
			['Memory slots', '4'],
			['Change over by load current', 'yes'],
			['Fan headers', '7']
		],
		[
			[-70, '429.00', 'EUR', shop],
			[-30, '412.00', 'EUR', shop]
		]
	),
	part(
		'board',
		'Hollin',
		'Anvil M',
		[
			['Phases, core', '10'],
			['Memory slots', '2'],
			['Change over by load current', 'no'],
			['Fan headers', '4']
		],
		[
			[-90, '189.00', 'USD', other],
			[-50, '174.00', 'EUR', shop]
		]
	),
	part(
		'memory',
		'Pennon',
		'6000 2 × 16 GB',
		[
			['Capacity', '32', 'GB'],
			['Rated data rate', '6000', 'MT/s'],
			['Rated CAS latency', '36'],
			['Rated voltage', '1.35', 'V'],
			['Height', '34', 'mm']
		],
		[
			[-100, '171.00', 'USD', other],
			[-55, '159.00', 'EUR', shop],
			[-18, '148.00', 'EUR', shop],
			[-3, '143.50', 'EUR', other]
		]
	),
	part(
		'memory',
		'Pennon',
		'5200 2 × 16 GB',
		[
			['Capacity', '32', 'GB'],
			['Rated data rate', '5200', 'MT/s'],
			['Rated CAS latency', '40'],
			['Rated voltage', '1.25', 'V'],
			['Height', '31', 'mm']
		],
		[[-40, '109.00', 'EUR', shop]]
	),
	part(
		'cooler',
		'Brisk',
		'360',
		[
			['Kind', 'closed loop'],
			['Radiator', '360', 'mm'],
			['Fans', '3 × 120', 'mm'],
			['Rated fan speed', '1900', '/min']
		],
		[
			[-65, '245.00', 'EUR', shop],
			[-19, '236.00', 'EUR', shop]
		]
	),
	part(
		'cooler',
		'Brisk',
		'Tower 14',
		[
			['Kind', 'tower, two stacks'],
			['Heat pipes', '7'],
			['Fans', '2 × 140', 'mm'],
			['Height', '162', 'mm']
		],
		[
			[-60, '92.00', 'EUR', shop],
			[-22, '89.90', 'EUR', shop]
		]
	),
	part(
		'cooler',
		'Brisk',
		'420',
		[
			['Kind', 'closed loop'],
			['Radiator', '420', 'mm'],
			['Fans', '3 × 140', 'mm']
		],
		[]
	),
	part(
		'graphics',
		'Marlow',
		'G70',
		[
			['Compute units', '72'],
			['Memory', '16', 'GB'],
			['Board power limit', '320', 'W'],
			['Temperature limit', '88', '°C'],
			['Length', '312', 'mm']
		],
		[]
	),
	part(
		'graphics',
		'Marlow',
		'G50',
		[
			['Compute units', '40'],
			['Memory', '12', 'GB'],
			['Board power limit', '200', 'W'],
			['Length', '242', 'mm']
		],
		[
			[-80, '459.00', 'USD', other],
			[-35, '419.00', 'EUR', shop]
		]
	),
	part(
		'storage',
		'Tarn',
		'S2 1 TB',
		[
			['Capacity', '1', 'TB'],
			['Interface', 'four lanes'],
			['Rated writes', '600', 'TB']
		],
		[[-58, '84.00', 'EUR', shop]]
	),
	part(
		'storage',
		'Tarn',
		'S4 2 TB',
		[
			['Capacity', '2', 'TB'],
			['Interface', 'four lanes'],
			['Rated writes', '1400', 'TB']
		],
		[[-28, '158.00', 'EUR', shop]]
	),
	part(
		'power-supply',
		'Ferrow',
		'850',
		[
			['Rated power', '850', 'W'],
			['Efficiency at half load', '92', '%'],
			['Cables', 'detachable']
		],
		[
			[-66, '142.00', 'EUR', shop],
			[-24, '136.00', 'EUR', shop]
		]
	),
	part(
		'power-supply',
		'Ferrow',
		'650',
		[
			['Rated power', '650', 'W'],
			['Efficiency at half load', '91', '%'],
			['Cables', 'detachable']
		],
		[[-52, '98.00', 'EUR', shop]]
	),
	part(
		'case',
		'Kestle',
		'Open Frame',
		[
			['Kind', 'open test bench'],
			['Fan places', '4']
		],
		[[-72, '117.00', 'EUR', shop]]
	),
	part(
		'other',
		'Lode',
		'Grey 4 g',
		[
			['Kind', 'thermal paste'],
			['Mass', '4', 'g']
		],
		[[-61, '8.90', 'EUR', shop]]
	)
];

/** The day the stores were first filled. */
const first = -69;

/** The parts with the prices seen by the day they came in, and each price that was seen later. */
export const parts = ({ calendar }: World): Act[] =>
	list.flatMap(({ prices, ...input }): Act[] => {
		const name = `${input.maker} ${input.model}`;
		const typed = ([day, amount, currency, source]: Price) => ({
			amount,
			currency,
			source,
			observedOn: calendar.date(day)
		});
		const early = prices.filter(([day]) => day <= first).map(typed);
		return [
			{
				at: calendar.at(first, '09:05'),
				who: 'Jonas',
				what: `part ${name}`,
				run: (ctx) => createPart(ctx, partInput.parse({ ...input, prices: early }))
			},
			...prices
				.filter(([day]) => day > first)
				.map((price): Act => ({
					at: calendar.at(price[0], '11:20'),
					who: 'Jonas',
					what: `price of ${name}`,
					run: (ctx) => addPartPrice(ctx, slugOf(name), priceInput.parse(typed(price)))
				}))
		];
	});
