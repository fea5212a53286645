import { keepKeys, readKeys, type ChangedKeys } from './keys';

/** How somebody likes the editor in this browser. */
interface View {
	outline: boolean;
	/** The one side that is shown; null for both. */
	alone: 'source' | 'page' | null;
}

const place = 'calipress:editor-view';

function readView(): View {
	try {
		const kept = JSON.parse(localStorage.getItem(place) ?? '{}') as Partial<View> | null;
		const alone = kept?.alone === 'source' || kept?.alone === 'page' ? kept.alone : null;
		return { outline: kept?.outline === true, alone };
	} catch {
		return { outline: false, alone: null };
	}
}

/** The keys and the view that somebody chose; a browser that keeps nothing forgets them with the page. */
export class Liking {
	keys = $state.raw<ChangedKeys>(readKeys());
	view = $state.raw<View>(readView());

	look(changed: Partial<View>): void {
		this.view = { ...this.view, ...changed };
		try {
			localStorage.setItem(place, JSON.stringify(this.view));
		} catch {
			return;
		}
	}

	changeKeys(changed: ChangedKeys): void {
		this.keys = changed;
		keepKeys(changed);
	}
}
