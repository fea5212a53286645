export * from './people';
export * from './stores';
export * from './instrument';
export * from './bench';
export * from './stability';
export * from './lab';
export * from './articles';
export * from './jobs';
