/** What is done to a reading, a run or a cell with a reason. */
export type ReasonedAct = 'exclude' | 'include' | 'void' | 'unsign';

interface ActWords {
	title: string;
	sub: string;
	hint: string;
	button: string;
	danger: boolean;
}

export const actWords: Record<ReasonedAct, ActWords> = {
	exclude: {
		title: 'Exclude a reading',
		sub: 'It stays on record and in the history, but no longer counts. A signature on the cell is taken off.',
		hint: 'What went wrong while it was taken, such as an update that ran in the background.',
		button: 'Exclude the reading',
		danger: false
	},
	include: {
		title: 'Take a reading back',
		sub: 'It counts again. A signature on the cell is taken off.',
		hint: 'Why it is sound after all.',
		button: 'Let it count',
		danger: false
	},
	void: {
		title: 'Void a run',
		sub: 'None of its readings count any more, for good; they stay on record. A signature on the cell is taken off.',
		hint: 'What makes the whole run unusable, such as a wrong profile.',
		button: 'Void the run',
		danger: true
	},
	unsign: {
		title: 'Take the signature off',
		sub: 'Articles that print this cell cannot be approved until it is signed again.',
		hint: 'What has to be looked at again.',
		button: 'Take it off',
		danger: false
	}
};
