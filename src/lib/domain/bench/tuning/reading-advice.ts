import type { SettingFact } from '../../articles/data';
import { grouped } from '../../shared/grouped';
import type { SettingQuantity } from '../words';
import { practice, type Advice } from './advice';
import { asStock, hasUnits, settingNumber } from './setting-number';
import { valuesOf, type GroupedSetting } from './setting-values';

const switchedOff = /^(off|disabled|none|no|0)\b/i;

/** A core ratio or clock that is set over stock while automatic boost is left on. */
export function boostAdvice(settings: readonly SettingFact[]): Advice[] {
	const boost = settings.find(
		(fact) => fact.quantity === 'automatic-boost' && !switchedOff.test(fact.value.trim())
	);
	const set = settings.filter(
		(fact) =>
			(fact.quantity === 'core-ratio' || fact.quantity === 'core-clock') &&
			settingNumber(fact.quantity, fact.value, fact.unit) !== null &&
			!asStock(fact)
	);
	if (!boost || set.length === 0) return [];
	return [
		{
			kind: 'boost-left-on',
			severity: 'advice',
			words: `${set.map((fact) => fact.setting).join(', ')} is set while ${boost.setting} is ${boost.value}. The clock may then move away from what is set; check in a trace which of them holds.`,
			settings: [...set, boost].map((fact) => fact.setting),
			source: practice
		}
	];
}

const once: readonly SettingQuantity[] = [
	'reference-clock',
	'memory-data-rate',
	'cas-latency',
	'fabric-clock',
	'memory-controller-clock'
];

/** Quantities that hold once for a rig, or once for a core group, and are set to different values in several places. */
export const twiceAdvice = (settings: readonly GroupedSetting[]): Advice[] =>
	once.flatMap((quantity) =>
		[...grouped(valuesOf(settings, quantity), ({ group }) => group).values()].flatMap((values): Advice[] => {
			if (new Set(values.map(({ value }) => value)).size < 2) return [];
			const names = values.map(({ fact }) => fact.setting);
			return [
				{
					kind: 'set-twice',
					severity: 'advice',
					words: `${names.join(' and ')} set the same thing to different values, so nothing is computed with it. Keep one, or say which group each is of.`,
					settings: names,
					source: 'how this application computes'
				}
			];
		})
	);

/** Numbers that are left out of every sum because their unit is missing or is not one of what they set. */
export const unitAdvice = (settings: readonly SettingFact[]): Advice[] =>
	settings.flatMap((fact): Advice[] => {
		const isNumber = /^[+\-−]?\s*\d/.test(fact.value.trim());
		if (!isNumber || !hasUnits(fact.quantity) || settingNumber(fact.quantity, fact.value, fact.unit))
			return [];
		const unit = fact.unit === '' ? 'without a unit that fits' : `in ${fact.unit}`;
		return [
			{
				kind: 'not-understood',
				severity: 'advice',
				words: `${fact.setting} is ${fact.value} ${unit}, so nothing is computed with it. Check its unit and what it sets.`,
				settings: [fact.setting],
				source: 'how this application computes'
			}
		];
	});
