/** What is asked in a form of its own; the rest is said by one press. */
export type DockForm = 'damaged' | 'unexpected' | 'graded' | 'sent-back' | 'rest-missing'
