/** Fewest and most characters of a password that is being chosen; nothing else is asked of its make-up. */
export const PASSWORD_LENGTH = { least: 12, most: 128 } as const
