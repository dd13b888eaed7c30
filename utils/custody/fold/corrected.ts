/** A correction does its work before the fold: the event it names is taken out, or says something else. */
export function corrected(): void {}
