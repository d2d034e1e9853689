/** The only way to learn the time, so that tests can hold it still. */
export type Clock = { readonly now: () => Date };

export const systemClock: Clock = { now: () => new Date() };
