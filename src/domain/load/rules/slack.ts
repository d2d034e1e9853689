/** Sums of lengths carry rounding; nothing is nearer or longer than wanted by less than this. In mm. */
export const slackMm = 0.01;

/** The same for masses, in kg. */
export const slackKg = 1e-6;
