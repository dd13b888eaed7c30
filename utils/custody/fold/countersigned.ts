/** A signature does its work before the fold: the entry it names counts in the firm's totals. */
export function countersigned(): void {}
