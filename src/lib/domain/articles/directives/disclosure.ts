import type { SampleDuty } from '../data';
import { element, escapeHtml } from '../html';
import { directive, found } from './shape';

const listed = (names: string[]): string => {
	const unique = [...new Set(names)];
	const last = unique.pop() ?? '';
	return unique.length === 0 ? last : `${unique.join(', ')} and ${last}`;
};

const how: Record<SampleDuty['provenance'], string> = {
	bought: 'bought',
	loaned: 'lent to us for this article',
	given: 'given to us free of charge',
	'pre-production': 'supplied to us before it was on sale'
};

/**
 * What must stand under an article about the samples it used: the texts agreed with partners, each once;
 * where none was agreed, plain words; and if all was bought, that.
 */
export function disclosureTexts(duties: readonly SampleDuty[]): string[] {
	const agreed = new Set<string>();
	const plain = new Map<SampleDuty['provenance'], string[]>();
	for (const duty of duties) {
		if (duty.disclosure?.trim()) agreed.add(duty.disclosure.trim());
		else if (duty.provenance !== 'bought') {
			plain.set(duty.provenance, [...(plain.get(duty.provenance) ?? []), duty.partName]);
		}
	}
	const own = [...plain].map(([provenance, names]) => {
		const verb = new Set(names).size === 1 ? 'was' : 'were';
		return `${listed(names)} ${verb} ${how[provenance]}.`;
	});
	const texts = [...agreed, ...own];
	return texts.length > 0 ? texts : ['Nothing tested here was lent or given to us: we bought all of it.'];
}

/** `::disclosure`: who lent or gave what was tested. */
export const disclosure = directive<string[]>({
	name: 'disclosure',
	level: 'block',
	words: 'Who lent or gave what was tested, in the words agreed with them.',
	attributes: [],
	resolve: (_call, data) =>
		found(
			data.campaigns.length === 0 && data.duties.length === 0
				? ['This article rests on no test of ours.']
				: disclosureTexts(data.duties)
		),
	render: (texts, { call }) => ({
		html: element(
			'aside',
			{ class: 'disclosure', 'data-line': call.line, 'aria-label': 'Disclosure' },
			texts
				.map((text, index) =>
					element('p', {}, (index === 0 ? '<strong>Disclosure.</strong> ' : '') + escapeHtml(text))
				)
				.join('')
		),
		plain: `Disclosure. ${texts.join(' ')}`,
		disclosure: true
	})
});
