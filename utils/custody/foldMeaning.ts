/**
 * What the fold makes of one and the same log, as a number that is raised by hand.
 *
 * It goes up whenever a fold, a finding in the fold or a cached column changes its meaning: then every database makes its
 * caches again at the next start. New keys of the state and new columns are seen without it.
 */
export const FOLD_MEANING = 8
