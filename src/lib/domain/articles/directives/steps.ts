import { printed, withUnit } from '../../shared/quantity';
import { element, escapeHtml } from '../html';
import { percentOverStock, riskOf } from '../risks';
import type { SettingFact } from '../data';
import { stepCautions } from './caution-texts';
import { attribute, findProfile, type ProfilePlace } from './lookup';
import { directive, found, missing, type CautionTopic } from './shape';

/** Menus of a path, outermost first. */
const menusOf = (path: string): string[] =>
	path
		.split('>')
		.map((menu) => menu.trim())
		.filter((menu) => menu !== '');

type Step = { open: string[] } | { set: SettingFact };

/** The settings as steps in menu order: a step for each menu entered, then one for each setting in it. */
export function stepsOf(settings: readonly SettingFact[]): Step[] {
	let current = '';
	return settings.flatMap((fact): Step[] => {
		const menus = menusOf(fact.menuPath);
		const path = menus.join(' › ');
		const entering = path !== current && path !== '';
		current = path;
		return entering ? [{ open: menus }, { set: fact }] : [{ set: fact }];
	});
}

function cautionHtml(fact: SettingFact, topic: CautionTopic | null): string {
	const text = topic && stepCautions[topic];
	if (!text) return '';
	const over = percentOverStock(fact);
	const amount =
		over === null
			? 'Stock leaves this to the board. '
			: `${withUnit(printed(over, { decimals: over < 10 ? 1 : 0 }), '%')} over stock. `;
	return element('span', { class: 'step-caution', role: 'note' }, escapeHtml(`Caution: ${amount}${text}`));
}

function stepHtml(step: Step): string {
	if ('open' in step) {
		return element(
			'li',
			{ class: 'step-menu' },
			`<span>Open <code>${step.open.map(escapeHtml).join(' › ')}</code></span>`
		);
	}
	const { set: fact } = step;
	const stock =
		fact.stockValue !== null && fact.stockValue !== fact.value
			? element('span', { class: 'step-stock' }, `stock ${escapeHtml(withUnit(fact.stockValue, fact.unit))}`)
			: '';
	const note = fact.note ? element('span', { class: 'step-note' }, escapeHtml(fact.note)) : '';
	return element(
		'li',
		{},
		`<span>${escapeHtml(fact.setting)}</span><span class="step-value">${stock}<code>${escapeHtml(withUnit(fact.value, fact.unit))}</code></span>${note}${cautionHtml(fact, riskOf(fact))}`
	);
}

/** `::steps{profile=}`: a profile as numbered steps in menu order, each caution beside the step it concerns. */
export const steps = directive<ProfilePlace>({
	name: 'steps',
	level: 'block',
	words: 'The settings of a profile as numbered steps, on a card that prints on one page.',
	attributes: [attribute.profile(), attribute.campaign()],
	resolve(call, data) {
		const place = findProfile(call, data);
		if (!place.ok || place.value.profile.settings.length > 0) return place.ok ? found(place.value) : place;
		return missing(
			`${place.value.profile.name} changes no settings, so there are no steps to print.`,
			place.value.campaign.profiles.filter((one) => one.settings.length > 0).map((one) => one.slug)
		);
	},
	render({ campaign, profile }, { call }) {
		const list = stepsOf(profile.settings);
		const risks = profile.settings.flatMap((fact) => {
			const topic = riskOf(fact);
			return topic ? [{ topic, setting: fact.setting }] : [];
		});
		const items = [...list.map(stepHtml), '<li class="step-menu"><span>Save and leave the menus</span></li>'];
		return {
			html: element(
				'section',
				{ class: 'steps', 'data-line': call.line, 'data-profile': profile.slug },
				`<h3>${escapeHtml(profile.name)}</h3>${element('p', { class: 'steps-sub' }, escapeHtml(`For rig ${campaign.rig.name}, revision ${campaign.rig.revision}${campaign.rig.firmware ? `, firmware ${campaign.rig.firmware}` : ''}. Write down what each setting says before you change it.`))}<ol>${items.join('')}</ol>`
			),
			plain: `Settings of ${profile.name}: ${profile.settings.map((fact) => `${fact.setting} ${withUnit(fact.value, fact.unit)}`).join('; ')}.`,
			profiles: [{ campaign: campaign.slug, profile: profile.slug }],
			risks: risks.map((risk) => ({
				...risk,
				campaign: campaign.slug,
				profile: profile.slug,
				line: call.line
			})),
			cautions: [...new Set(risks.map((risk) => risk.topic))]
		};
	}
});
