/** Something that can be done on the page that is open. */
export interface PageCommand {
	id: string;
	label: string;
	/** Shown beside it, as KeyHint writes keys. */
	keys: string;
	run: () => void;
}

const here = $state<{ commands: readonly PageCommand[] }>({ commands: [] });

/** What the open page offers to the list of places and acts. */
export const pageCommands = (): readonly PageCommand[] => here.commands;

/** Offers a page's commands while it stands; only in the browser. Returns what takes them away. */
export function offerCommands(commands: readonly PageCommand[]): () => void {
	here.commands = commands;
	return () => {
		if (here.commands === commands) here.commands = [];
	};
}
