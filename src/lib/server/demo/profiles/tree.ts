import { profileEdit, profileInput } from '../../../schemas/profile';
import type { SettingQuantity } from '../../../domain/bench/words';
import { createProfile } from '../../services/bench-plan/create-profile';
import { editProfile } from '../../services/bench-plan/edit-profile';
import type { Act, World } from '../act';
import type { Who } from '../staff';

/** Menu path, setting, value, unit, what it sets, note. */
export type Row = [
	menuPath: string,
	setting: string,
	value: string,
	unit: string,
	quantity: SettingQuantity,
	note?: string
];

interface Written {
	slug: string;
	name: string;
	/** Stock when left out. */
	parent?: string;
	notes: string;
	rows: Row[];
}

export interface Tree {
	rig: string;
	day: number;
	who: Who;
	stock: { notes: string; rows: Row[] };
	profiles: Written[];
}

const settingsOf = (rows: Row[]) =>
	rows.map(([menuPath, setting, value, unit, quantity, note = '']) => ({
		menuPath,
		setting,
		value,
		unit,
		quantity,
		note
	}));

/** Writes a rig's stock as it was read off the machine, then the profiles over it. */
export function treeActs({ calendar }: World, { rig, day, who, stock, profiles }: Tree): Act[] {
	return [
		{
			at: calendar.at(day, '15:00'),
			who,
			what: `stock of ${rig}`,
			run: (ctx) =>
				editProfile(
					ctx,
					rig,
					'stock',
					profileEdit.parse({
						name: 'Stock',
						notes: stock.notes,
						settings: settingsOf(stock.rows),
						version: 1
					})
				)
		},
		...profiles.map(({ rows, ...profile }, index): Act => ({
			at: calendar.at(day, `15:${String(10 + index * 4)}`),
			who,
			what: `profile ${profile.slug} of ${rig}`,
			run: (ctx) => createProfile(ctx, profileInput.parse({ rig, ...profile, settings: settingsOf(rows) }))
		}))
	];
}
