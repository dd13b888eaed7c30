/** The type of the problem that is answered where somebody else's session would send a person's entries. */
export const NOT_ITS_AUTHOR = 'not-its-author'
