/** What a photo can be of. */
export const PHOTO_SUBJECTS = ['stamp', 'damage', 'scale', 'other'] as const

export type PhotoSubject = (typeof PHOTO_SUBJECTS)[number]
