/** The one password of the demo's people. It is printed on the demo's sign-in page and opens nothing else. */
export const demoPassword = 'measure-then-print';
