/** What every plate says of itself, in print already. */
export interface PlateBase {
	title: string;
	/** Under the title: what is shown and which way is better. */
	sub: string;
	/** Under the drawing: what was measured, n, what the whisker is, rig and dates. */
	foot: string[];
	campaign: string;
}
