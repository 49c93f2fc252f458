/** Commands take their time from a clock, so that a demo or a test can set it. */
export type Clock = () => Date;

export const systemClock: Clock = () => new Date();
