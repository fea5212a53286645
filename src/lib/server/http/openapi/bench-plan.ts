import { z } from 'zod';
import { directions, headlines, settingQuantities, workloadClasses } from '../../../domain/bench/words';
import { partKinds, provenances } from '../../../domain/stores/words';
import { partInput, partsApiQuery } from '../../../schemas/part';
import { profileInput, profilesApiQuery } from '../../../schemas/profile';
import { rigInput, rigsApiQuery } from '../../../schemas/rig';
import { sampleInput, samplesApiQuery } from '../../../schemas/sample';
import { workloadInput, workloadsApiQuery } from '../../../schemas/workload';
import { describe } from '../openapi';
import { pageOf } from '../paging';

const time = z.iso.datetime();
const row = { id: z.number(), slug: z.string() };

const price = z.object({
	amount: z.string().describe('Decimal, with the digits of its currency, such as "689.00".'),
	amountMinor: z.number().describe('The same in minor units.'),
	currency: z.string().describe('ISO 4217.'),
	observedOn: z.iso.date(),
	source: z.string()
});

const partItem = z.object({
	...row,
	kind: z.enum(partKinds),
	maker: z.string(),
	model: z.string(),
	specification: z.array(z.object({ name: z.string(), value: z.string(), unit: z.string().optional() })),
	price: price.nullable().describe('The latest seen.'),
	createdAt: time
});
const partWhole = partItem.extend({ prices: z.array(price).describe('The latest first.') });

const sampleItem = z.object({
	...row,
	part: z.object({ slug: z.string(), maker: z.string(), model: z.string(), kind: z.enum(partKinds) }),
	serial: z.string(),
	provenance: z.enum(provenances),
	condition: z.string(),
	place: z.string(),
	rigs: z.array(z.string()).describe('Slugs of the rigs that have it now.'),
	createdAt: time
});

const workloadItem = z.object({
	...row,
	name: z.string(),
	programVersion: z.string(),
	settings: z.string().describe('How it is run.'),
	quantity: z.string(),
	unit: z.string(),
	better: z.enum(directions),
	class: z.enum(workloadClasses),
	warmUps: z.number(),
	repeats: z.number(),
	coolDownS: z.number(),
	leastDifferencePercent: z.number().describe('Least difference that matters, in percent.'),
	headline: z.enum(headlines).describe('Which average stands in print.'),
	createdAt: time
});

const versions = { firmware: z.string(), driver: z.string(), os: z.string() };

const rigItem = z.object({
	...row,
	name: z.string(),
	firmwareFamily: z
		.string()
		.describe('By which the meanings of its settings are looked up; empty where it is of none.'),
	revision: z.number(),
	...versions,
	samples: z.array(
		z.object({
			slug: z.string(),
			part: z.string(),
			kind: z.enum(partKinds),
			serial: z.string(),
			provenance: z.enum(provenances)
		})
	),
	createdAt: time
});
const rigWhole = rigItem.extend({
	revisions: z
		.array(
			z.object({
				number: z.number(),
				change: z.string().describe('What changed against the revision before, in words.'),
				...versions,
				samples: z.array(z.string()),
				createdAt: time
			})
		)
		.describe('The newest first.'),
	profiles: z.array(z.object({ ...row, name: z.string(), parent: z.string().nullable() }))
});

const setting = {
	menuPath: z.string().describe("Menus from the outermost in, with ' > ' between them."),
	setting: z.string(),
	value: z.string(),
	unit: z.string(),
	quantity: z.enum(settingQuantities),
	note: z.string()
};

const profileItem = z.object({
	...row,
	rig: z.string(),
	name: z.string(),
	parent: z.string().nullable().describe('Slug of the parent; null for stock.'),
	notes: z.string(),
	settings: z.array(z.object(setting)).describe('What it sets itself, in order.'),
	createdAt: time
});
const profileWhole = profileItem.extend({
	effective: z
		.array(
			z.object({
				...setting,
				parentValue: z.string().nullable(),
				stockValue: z.string().nullable(),
				group: z.number().nullable().describe('Chiplet or core group; null where it is for all.'),
				known: z
					.enum(['row', 'mapping', 'unknown'])
					.describe('Who says what it sets: the row, the lab’s meanings of its firmware, or nobody.')
			})
		)
		.describe('With what it inherits, in menu order, and the lab’s meanings put in.'),
	derived: z
		.array(
			z.object({
				name: z.string(),
				value: z.number(),
				unit: z.string(),
				decimals: z.number().describe('Decimals to print it with.'),
				text: z.string().optional().describe('Printed in the value’s place, such as 2 : 3 : 3.'),
				how: z.string()
			})
		)
		.describe('What follows from the settings by arithmetic; nothing is rounded.'),
	advice: z
		.array(
			z.object({
				kind: z.string(),
				severity: z.enum(['advice', 'warning']).describe('A warning is about a limit of the lab.'),
				words: z.string(),
				settings: z.array(z.string()).describe('Names of the settings it is about.'),
				source: z.string()
			})
		)
		.describe('What is worth another look, by the lab’s limits among others; none is no promise of safety.')
});

/** Parts, samples, workloads, rigs and profiles. */
export const benchPlan = [
	describe({
		method: 'get',
		path: '/api/v1/parts',
		act: 'stores.read',
		summary: 'Parts in the order they were added, with the latest price of each',
		query: partsApiQuery,
		response: pageOf(partItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/parts',
		act: 'stores.edit',
		summary: 'Add a part, with the prices already seen of it',
		body: partInput,
		response: partWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/parts/{part}',
		act: 'stores.read',
		summary: 'One part with every price seen',
		response: partWhole
	}),
	describe({
		method: 'get',
		path: '/api/v1/samples',
		act: 'stores.read',
		summary: 'Samples in the order they were added',
		query: samplesApiQuery,
		response: pageOf(sampleItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/samples',
		act: 'stores.edit',
		summary: 'Add a sample of a part; without a slug it gets the next number of its part',
		body: sampleInput,
		response: sampleItem,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/samples/{sample}',
		act: 'stores.read',
		summary: 'One sample',
		response: sampleItem
	}),
	describe({
		method: 'get',
		path: '/api/v1/workloads',
		act: 'bench.read',
		summary: 'Workloads in the order they were defined',
		query: workloadsApiQuery,
		response: pageOf(workloadItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/workloads',
		act: 'bench.plan',
		summary: 'Define a workload and its protocol',
		body: workloadInput,
		response: workloadItem,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/workloads/{workload}',
		act: 'bench.read',
		summary: 'One workload',
		response: workloadItem
	}),
	describe({
		method: 'get',
		path: '/api/v1/rigs',
		act: 'bench.read',
		summary: 'Rigs as they stand now, in the order they were put together',
		query: rigsApiQuery,
		response: pageOf(rigItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/rigs',
		act: 'bench.plan',
		summary: 'Put samples together as a rig: its first revision, and the profile stock',
		body: rigInput,
		response: rigWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/rigs/{rig}',
		act: 'bench.read',
		summary: 'One rig with its revisions and profiles',
		response: rigWhole
	}),
	describe({
		method: 'get',
		path: '/api/v1/profiles',
		act: 'bench.read',
		summary: 'Profiles of one rig, or of all, in the order they were written',
		query: profilesApiQuery,
		response: pageOf(profileItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/profiles',
		act: 'bench.plan',
		summary: "Add a profile to a rig's tree, over its parent or, without one, over stock",
		body: profileInput,
		response: profileWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/profiles/{profile}',
		act: 'bench.read',
		summary: 'One profile by id, or by slug with its rig, with what it inherits and what follows from it',
		query: z.object({ rig: z.string().optional().describe('Slug or id of the rig that a slug belongs to.') }),
		response: profileWhole
	})
];
