import { parseReading } from '../../bench/numbers';
import { printed, withUnit } from '../../shared/quantity';
import type { ArticleData } from '../data';
import { front, type Datum } from './datum';
import { figuresOf } from './figures';
import type { UnitReader } from './prose-units';

/** The number of a setting's value and its unit, as in “49.5” or “Fixed at 40 %”; null where it is a word. */
function numberIn(value: string, unit: string): { value: number; unit: string } | null {
	const whole = parseReading(value);
	if (whole.ok) return { value: whole.value, unit };
	const match = /(\d+(?:\.\d+)?)\s*(%|[^\s\d]{0,5})$/.exec(value.trim());
	return match ? { value: Number(match[1]), unit: match[2] || unit } : null;
}

/** Settings and derived facts of every profile. */
export const settingFacts = (data: ArticleData): Datum[] =>
	data.campaigns.flatMap((campaign) =>
		campaign.profiles.flatMap((profile) => {
			const base = {
				kind: 'setting' as const,
				interval: null,
				campaign: campaign.slug,
				workload: null,
				profile: profile.slug,
				over: null,
				range: null
			};
			const of = (name: string) => `${name}, ${front(profile.name)}`;
			return [
				...profile.settings.flatMap(({ setting, value, unit }): Datum[] => {
					const number = numberIn(value, unit);
					const text = withUnit(value, unit);
					return number ? [{ ...base, ...number, called: setting, name: of(setting), printed: text }] : [];
				}),
				...profile.derived.flatMap(({ name, value, unit, decimals, text }): Datum[] =>
					text === undefined
						? [
								{
									...base,
									value,
									unit,
									called: name,
									name: of(name),
									printed: withUnit(printed(value, { decimals }), unit)
								}
							]
						: []
				)
			];
		})
	);

/** Numbers with units in the methods of the workloads, and what the protocols fix. */
export const methodFacts = (data: ArticleData, units: UnitReader): Datum[] =>
	data.campaigns.flatMap((campaign) =>
		campaign.workloads.flatMap((workload): Datum[] => {
			const datum = (value: number, unit: string, text: string): Datum => ({
				kind: 'method',
				value,
				unit,
				interval: null,
				campaign: campaign.slug,
				workload: workload.slug,
				profile: null,
				over: null,
				called: null,
				name: `Method of ${workload.name}`,
				printed: text,
				range: null
			});
			const written = figuresOf(workload.settings, [], units).flatMap((figure) => {
				const [first] = figure.readings;
				const { quantity } = figure;
				if (!first || figure.not !== null) return [];
				const unit = quantity.kind === 'unit' ? quantity.unit : quantity.kind === 'percent' ? '%' : null;
				return unit === null
					? []
					: [datum(first.value, unit, workload.settings.slice(figure.from, figure.to))];
			});
			const { leastDifferencePercent: least, coolDownS } = workload;
			return [
				...written,
				datum(least, '%', `${withUnit(printed(least), '%')}, the least difference that matters`),
				...(coolDownS > 0 ? [datum(coolDownS, 's', `${withUnit(printed(coolDownS), 's')} to cool down`)] : [])
			];
		})
	);
