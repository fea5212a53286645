import { z } from 'zod';
import { settingQuantities } from '../../../domain/bench/words';
import { partKinds } from '../../../domain/stores/words';
import { meaningEdit, meaningInput, meaningsApiQuery } from '../../../schemas/firmware-meaning';
import { instrumentEdit, instrumentInput, instrumentsApiQuery } from '../../../schemas/instrument';
import { labLimitEdit, labLimitInput, limitsApiQuery } from '../../../schemas/lab-limit';
import { suiteEdit, suiteInput, suitesApiQuery } from '../../../schemas/suite';
import { describe } from '../openapi';
import { pageOf } from '../paging';

const time = z.iso.datetime();
const version = z.number().describe('Send it with an edit; one over a newer version is refused.');
const row = { id: z.number(), slug: z.string(), name: z.string() };
const written = { createdBy: z.string(), createdAt: time, version };

const suiteItem = z.object({
	...row,
	purpose: z.string(),
	workloads: z
		.array(z.object({ workload: z.string(), repeats: z.number().describe('Readings each cell needs.') }))
		.describe('In the suite’s order.'),
	archived: z.boolean(),
	createdAt: time,
	version
});

const instrumentItem = z.object({
	...row,
	serial: z.string(),
	quantity: z.string(),
	unit: z.string(),
	accuracyPercent: z.number().describe('Limits of error: ± this share of the reading, in percent, plus'),
	accuracyAbsolute: z.number().describe('± this much, in the unit.'),
	resolution: z.number().describe('The last digit it shows, in the unit.'),
	calibratedOn: z.iso.date().nullable(),
	calibrationDueOn: z.iso.date().nullable(),
	accuracySource: z.string(),
	retired: z.boolean(),
	createdAt: time,
	version
});
const instrumentWhole = instrumentItem.extend({
	uses: z
		.array(z.object({ campaign: z.string(), workload: z.string() }))
		.describe('Columns of campaigns that name it.')
});

const limitItem = z.object({
	id: z.number(),
	quantity: z.enum(settingQuantities),
	partKind: z.enum(partKinds).describe('Of which kind of part; other for every rig.'),
	limit: z.number(),
	unit: z.string(),
	source: z.string(),
	...written
});

const meaningItem = z.object({
	id: z.number(),
	family: z.string().describe('Firmware family.'),
	setting: z.string(),
	quantity: z.enum(settingQuantities).describe('What it sets.'),
	coreGroup: z.number().describe('Chiplet or core group; 0 for all.'),
	...written
});

/** Suites, instruments, limits and meanings of firmware's settings. */
export const benchLab = [
	describe({
		method: 'get',
		path: '/api/v1/suites',
		act: 'bench.read',
		summary: 'Suites in the order they were put together',
		query: suitesApiQuery,
		response: pageOf(suiteItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/suites',
		act: 'bench.plan',
		summary: 'Put workloads together as a suite',
		body: suiteInput,
		response: suiteItem,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/suites/{suite}',
		act: 'bench.read',
		summary: 'One suite',
		response: suiteItem
	}),
	describe({
		method: 'put',
		path: '/api/v1/suites/{suite}',
		act: 'bench.plan',
		summary: 'Change a suite: all of it is replaced, what is left out takes its default',
		body: suiteEdit,
		response: suiteItem
	}),
	describe({
		method: 'get',
		path: '/api/v1/instruments',
		act: 'bench.read',
		summary: 'Instruments in the order they were written down',
		query: instrumentsApiQuery,
		response: pageOf(instrumentItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/instruments',
		act: 'bench.plan',
		summary: 'Write an instrument down with its limits of error',
		body: instrumentInput,
		response: instrumentWhole,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/instruments/{instrument}',
		act: 'bench.read',
		summary: 'One instrument with the columns that name it',
		response: instrumentWhole
	}),
	describe({
		method: 'put',
		path: '/api/v1/instruments/{instrument}',
		act: 'bench.plan',
		summary:
			'Change an instrument, such as after a calibration: all of it is replaced, what is left out takes its default',
		body: instrumentEdit,
		response: instrumentWhole
	}),
	describe({
		method: 'get',
		path: '/api/v1/limits',
		act: 'bench.read',
		summary: 'The lab’s own limits in the order they were written down',
		query: limitsApiQuery,
		response: pageOf(limitItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/limits',
		act: 'bench.plan',
		summary: 'Write a limit of the lab down',
		body: labLimitInput,
		response: limitItem,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/limits/{limit}',
		act: 'bench.read',
		summary: 'One limit',
		response: limitItem
	}),
	describe({
		method: 'put',
		path: '/api/v1/limits/{limit}',
		act: 'bench.plan',
		summary: 'Change a limit: all of it is replaced',
		body: labLimitEdit,
		response: limitItem
	}),
	describe({
		method: 'get',
		path: '/api/v1/meanings',
		act: 'bench.read',
		summary: 'What settings of firmware set, in the order it was written down',
		query: meaningsApiQuery,
		response: pageOf(meaningItem)
	}),
	describe({
		method: 'post',
		path: '/api/v1/meanings',
		act: 'bench.plan',
		summary: 'Say what a setting of a firmware family sets',
		body: meaningInput,
		response: meaningItem,
		status: 201
	}),
	describe({
		method: 'get',
		path: '/api/v1/meanings/{meaning}',
		act: 'bench.read',
		summary: 'One meaning',
		response: meaningItem
	}),
	describe({
		method: 'put',
		path: '/api/v1/meanings/{meaning}',
		act: 'bench.plan',
		summary: 'Change a meaning: all of it is replaced, what is left out takes its default',
		body: meaningEdit,
		response: meaningItem
	})
];
