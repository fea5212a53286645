import type { Check } from './finding';

/** A profile that is printed over one of the lab's own limits is named, so that an editor can ask its tester. */
export const labLimits: Check = ({ data, page }) =>
	page.uses.profiles.flatMap((used) => {
		const campaign = data.campaigns.find((one) => one.slug === used.campaign);
		const profile = campaign?.profiles.find((one) => one.slug === used.profile);
		return (profile?.advice ?? [])
			.filter((one) => one.severity === 'warning')
			.map((one) => ({
				check: 'lab-limits',
				severity: 'advice' as const,
				message: `${profile?.name ?? used.profile}: ${one.words}`,
				mend: 'Ask its tester whether it is meant so, and say in the text why it goes that far.',
				place: { kind: 'text' as const }
			}));
	});
