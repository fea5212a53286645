/** The id that an address names; 0, which no row has, where it is none. */
export const idOf = (param: string): number => (/^[1-9]\d{0,9}$/.test(param) ? Number(param) : 0);
