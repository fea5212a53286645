import { z } from 'zod';
import { settingQuantities } from '../domain/bench/words';
import { line, number, optionalSlug, paragraphs, reference, versionSeen } from './fields';
import { apiListing } from './listing';

/** Menus from the outermost in, written with > or ›, kept with ' > ' between them. */
const menuPath = line(300)
	.default('')
	.transform((path) =>
		path
			.split(/[>›]/)
			.map((menu) => menu.trim())
			.filter((menu) => menu !== '')
			.join(' > ')
	);

/** One setting; a row left blank is dropped, one half filled is refused. */
const settingRow = z
	.object({
		/** Where the row belongs, for forms without scripts; rows without one stay where they are. */
		order: z
			.union([z.literal(''), number({ min: 0, max: 100_000, decimals: 3 })])
			.default('')
			.transform((order) => (order === '' ? null : order)),
		menuPath,
		setting: line(160).default(''),
		value: line(80).default(''),
		unit: line(20).default(''),
		/** What it sets, where the application can compute with it. */
		quantity: z.enum(settingQuantities, 'Choose what it sets, or other.').default('other'),
		note: line(500).default('')
	})
	.superRefine((row, ctx) => {
		// A menu alone is a row begun and left: it is dropped like a blank one.
		const filled = row.setting || row.value || row.unit || row.note;
		if (filled && !row.setting)
			ctx.addIssue({ code: 'custom', path: ['setting'], message: 'Name the setting, or clear the row.' });
		if (filled && !row.value)
			ctx.addIssue({ code: 'custom', path: ['value'], message: 'Give its value, or clear the row.' });
	});

const settings = z
	.array(settingRow)
	.max(300, 'Keep a profile to 300 settings.')
	.default([])
	.superRefine((rows, ctx) => {
		const first = new Map<string, number>();
		rows.forEach((row, index) => {
			if (row.setting === '') return;
			const key = `${row.menuPath}\n${row.setting}`.toLowerCase();
			const before = first.get(key);
			if (before === undefined) first.set(key, index);
			else
				ctx.addIssue({
					code: 'custom',
					path: [index, 'setting'],
					message: `Row ${before + 1} sets this already.`
				});
		});
	})
	.transform((rows) =>
		rows
			.map((row, index) => ({ ...row, order: row.order ?? index + 1 }))
			.filter((row) => row.setting !== '')
			.sort((a, b) => a.order - b.order)
			.map(({ menuPath, setting, value, unit, quantity, note }) => ({
				menuPath,
				setting,
				value,
				unit,
				quantity,
				note
			}))
	);

const profileFields = {
	name: line(160).min(1, 'A profile needs a name.'),
	notes: paragraphs(10_000).default(''),
	settings
};

/** A new profile over a parent; without one, over stock. */
export const profileInput = z.object({
	rig: reference('Name the rig.'),
	slug: optionalSlug,
	parent: reference('Name the parent profile.').optional(),
	...profileFields
});
export type ProfileInput = z.output<typeof profileInput>;
export type ProfileTyped = z.input<typeof profileInput>;

/** A change to a profile; its place in the tree and its slug stay. */
export const profileEdit = z.object({ ...profileFields, version: versionSeen });
export type ProfileEdit = z.output<typeof profileEdit>;
export type ProfileEditTyped = z.input<typeof profileEdit>;

export type SettingTyped = NonNullable<ProfileTyped['settings']>[number];
export type SettingInput = ProfileInput['settings'][number];

export const blankSetting = (menuPath = ''): SettingTyped => ({
	order: '',
	menuPath,
	setting: '',
	value: '',
	unit: '',
	quantity: 'other',
	note: ''
});

/** Stored settings as their form shows them, with blank rows at the end to be filled without scripts. */
export const asTypedSettings = (stored: readonly SettingInput[], blank = 3): SettingTyped[] =>
	[...stored, ...Array.from({ length: blank }, () => blankSetting())].map((setting, index) => ({
		...setting,
		order: index + 1
	}));

/** What a form's rows would set, for the facts and steps beside it while it is being filled. */
export const settingsTyped = (rows: readonly SettingTyped[]): SettingInput[] =>
	rows.flatMap((row) => {
		const setting = settingRow.safeParse(row);
		if (!setting.success || setting.data.setting === '') return [];
		const { order: _, ...kept } = setting.data;
		return [kept];
	});

/** What the list of profiles takes from its address. */
export const profilesApiQuery = apiListing.extend({
	rig: z.string().trim().max(80).optional().describe('Slug or id of a rig.')
});
export type ProfilesApiQuery = z.output<typeof profilesApiQuery>;
