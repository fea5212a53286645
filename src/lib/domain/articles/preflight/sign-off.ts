import { listed, type Check } from './finding';
import { byCampaign, shownCells } from './used-cells';

/** Data that the article shows is signed off by a tester. A change after the signature takes it away, a void included. */
export const signOff: Check = ({ data, page }) =>
	byCampaign(shownCells(data, page.uses.cells).filter((cell) => cell.figures.signedBy === null)).map(
		([campaign, cells]) => ({
			check: 'sign-off',
			severity: 'blocking',
			message: `${campaign.name}: ${listed(cells.map((cell) => cell.name))} ${cells.length === 1 ? 'is' : 'are'} not signed off.`,
			mend: 'A tester signs the cells off on the campaign’s page, or the article leaves them out.',
			place: { kind: 'campaign', campaign: campaign.slug }
		})
	);
