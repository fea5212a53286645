import { raises, type RaiseTopic } from '../../bench/tuning/raises';
import { listed, type Check } from './finding';

const raised: Record<RaiseTopic, string> = {
	voltage: 'raises a voltage',
	power: 'raises a power or current limit',
	heat: 'raises a temperature limit'
};

/** A profile that raises voltage, power, current or heat over stock is printed with a caution of that topic. */
export const caution: Check = ({ data, page }) => {
	const given = new Set<string>(page.cautions);
	return page.uses.profiles.flatMap((used) => {
		const campaign = data.campaigns.find((one) => one.slug === used.campaign);
		const profile = campaign?.profiles.find((one) => one.slug === used.profile);
		if (!profile) return [];
		const missing = raises(profile.settings).filter((raise) => !given.has(raise.topic));
		return [...new Set(missing.map((raise) => raise.topic))].map((topic) => {
			const settings = missing.filter((raise) => raise.topic === topic).map((raise) => raise.setting);
			return {
				check: 'caution',
				severity: 'blocking' as const,
				message: `${profile.name} ${raised[topic]} (${listed([...new Set(settings)])}) and the article has no caution about it.`,
				mend: `Put ::caution{topic=${topic}} on a line of its own, beside what it concerns.`,
				place: { kind: 'text' as const }
			};
		});
	});
};
