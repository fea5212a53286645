import { asStock } from '../../bench/tuning/setting-number';
import { steps as stepsOf, type Step } from '../../bench/tuning/steps';
import { printed, withUnit } from '../../shared/quantity';
import { element, escapeHtml } from '../html';
import type { SettingFact } from '../data';
import { stepCautions } from './caution-texts';
import { attribute, findProfile, type ProfilePlace } from './lookup';
import { directive, found, missing } from './shape';

type SetStep = Extract<Step, { kind: 'set' }>;

/** A stored value with its unit, where the value does not carry one itself. */
const valued = (value: string, unit: string): string =>
	/[a-z°×%]/i.test(value) ? value : withUnit(value, unit);

function cautionHtml({ caution, stockValue }: SetStep): string {
	if (!caution) return '';
	const { byPercent } = caution;
	const amount =
		byPercent !== null
			? `${withUnit(printed(byPercent, { decimals: byPercent < 10 ? 1 : 0 }), '%')} over stock. `
			: stockValue === null
				? 'Stock leaves this to the board. '
				: '';
	return element(
		'span',
		{ class: 'step-caution', role: 'note' },
		escapeHtml(`Caution: ${amount}${stepCautions[caution.topic]}`)
	);
}

function stepHtml(step: Step): string {
	if (step.kind !== 'set') {
		const verb = step.kind === 'open-menu' ? 'Open' : 'Leave';
		const path = step.path.map(escapeHtml).join(' › ');
		return element('li', { class: 'step-menu' }, `<span>${verb} <code>${path}</code></span>`);
	}
	const stock =
		step.stockValue !== null && step.changed
			? element('span', { class: 'step-stock' }, escapeHtml(`stock ${valued(step.stockValue, step.unit)}`))
			: '';
	const note = step.note ? element('span', { class: 'step-note' }, escapeHtml(step.note)) : '';
	const value = element('code', {}, escapeHtml(valued(step.value, step.unit)));
	return element(
		'li',
		{},
		`<span>${escapeHtml(step.setting)}</span><span class="step-value">${stock}${value}</span>${note}${cautionHtml(step)}`
	);
}

/** One step as it is spoken, its caution right after it. */
function stepSpoken(step: Step): string[] {
	if (step.kind !== 'set') {
		const act = step.kind === 'leave' ? `leave ${step.menu}` : `open ${step.path.join(', then ')}`;
		return [`Step ${step.number}: ${act}.`];
	}
	const to = `Step ${step.number}: set ${step.setting} to ${valued(step.value, step.unit)}.`;
	return step.caution ? [to, `Caution: ${stepCautions[step.caution.topic]}`] : [to];
}

/** `::steps{profile=}`: a profile as numbered steps in menu order, each caution beside the step it concerns. */
export const steps = directive<ProfilePlace & { settings: SettingFact[] }>({
	name: 'steps',
	level: 'block',
	words: 'The settings of a profile as numbered steps, on a card that prints on one page.',
	attributes: [
		attribute.profile(),
		attribute.campaign(),
		attribute.oneOf('show', 'what differs from stock (if left out), or all settings', ['changed', 'all'])
	],
	resolve(call, data) {
		const place = findProfile(call, data);
		if (!place.ok) return place;
		const { campaign, profile } = place.value;
		const all = call.attributes.show === 'all';
		const settings = profile.settings.filter((fact) => all || !asStock(fact));
		return settings.length > 0
			? found({ ...place.value, settings })
			: missing(
					`${profile.name} changes no settings, so there are no steps to print.`,
					campaign.profiles
						.filter((one) => one.settings.some((fact) => !asStock(fact)))
						.map((one) => one.slug)
				);
	},
	render({ campaign, profile, settings }, { call }) {
		const list = stepsOf(settings);
		const topics = list.flatMap((step) => (step.kind === 'set' && step.caution ? [step.caution.topic] : []));
		const { rig } = campaign;
		const where = `For rig ${rig.name}, revision ${rig.revision}${rig.firmware ? `, firmware ${rig.firmware}` : ''}. Write down what each setting says before you change it.`;
		const items = [...list.map(stepHtml), '<li class="step-menu"><span>Save and restart</span></li>'];
		return {
			html: element(
				'section',
				{ class: 'steps', 'data-line': call.line, 'data-profile': profile.slug },
				element('h3', {}, escapeHtml(profile.name)) +
					element('p', { class: 'steps-sub' }, escapeHtml(where)) +
					`<ol>${items.join('')}</ol>`
			),
			plain: `Settings of ${profile.name}: ${settings.map((fact) => `${fact.setting} ${valued(fact.value, fact.unit)}`).join('; ')}.`,
			spoken: [
				`Settings of ${profile.name}.`,
				where,
				...list.flatMap(stepSpoken),
				`Step ${list.length + 1}: save and restart.`
			].join('\n'),
			profiles: [{ campaign: campaign.slug, profile: profile.slug }],
			cautions: [...new Set(topics)]
		};
	}
});
