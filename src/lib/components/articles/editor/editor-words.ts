import { EditorState } from '@codemirror/state';

/** The editor's own words, as the rest of the application writes them. */
export const editorWords = EditorState.phrases.of({
	Find: 'Find',
	Replace: 'Replace with',
	next: 'Next',
	previous: 'Previous',
	all: 'Select all',
	'match case': 'Match case',
	regexp: 'Pattern',
	'by word': 'Whole words',
	replace: 'Replace',
	'replace all': 'Replace all',
	close: 'Close',
	'current match': 'this match',
	'on line': 'on line',
	'replaced match on line $': 'Replaced on line $',
	'replaced $ matches': 'Replaced $',
	Diagnostics: 'Things to mend',
	'No diagnostics': 'Nothing to mend',
	Completions: 'What could stand here'
});
