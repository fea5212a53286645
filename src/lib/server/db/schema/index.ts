export * from './people';
export * from './stores';
export * from './bench';
export * from './articles';
export * from './jobs';
