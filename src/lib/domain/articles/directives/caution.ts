import { element, escapeHtml } from '../html';
import { cautionTexts } from './caution-texts';
import { attribute } from './lookup';
import { cautionTopics, directive, found, type CautionTopic } from './shape';

/** `::caution{topic=}`: the usual caution on one matter, in plain words. */
export const caution = directive<CautionTopic>({
	name: 'caution',
	level: 'block',
	words: 'The usual caution on one matter, in plain words.',
	attributes: [attribute.oneOf('topic', 'what it is about', cautionTopics, true)],
	// The renderer has held the topic against the list already.
	resolve: (call) => found(call.attributes.topic as CautionTopic),
	render(topic, { call }) {
		const { title, body } = cautionTexts[topic];
		return {
			html: element(
				'aside',
				{ class: 'caution', 'data-topic': topic, 'data-line': call.line, 'aria-label': `Caution: ${title}` },
				element('p', {}, `<strong>Caution: ${escapeHtml(title.toLowerCase())}.</strong> ${escapeHtml(body)}`)
			),
			plain: `Caution: ${title.toLowerCase()}. ${body}`,
			cautions: [topic]
		};
	}
});
