declare module 'commonmark-spec' {
	interface Example {
		number: number;
		section: string;
		markdown: string;
		html: string;
	}
	const spec: { tests: Example[]; text: string };
	export default spec;
}
