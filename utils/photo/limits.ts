/** The largest file of a photo that is taken, in bytes. */
export const LARGEST_PHOTO = 8 * 1024 * 1024

/** Most pixels that are decoded, counted before: a small file can say that it is a picture of any size. */
export const MOST_PIXELS = 50_000_000

/** The longest side that is decoded, in pixels: of millions of rows one pixel wide each row takes its time. */
export const LONGEST_SIDE_TAKEN = 20_000

/** The longest side of a photo as it is kept, in pixels: a stamp's characters can still be read. */
export const LONGEST_SIDE = 2048

/** The longest side of its thumbnail, in pixels. */
export const THUMB_SIDE = 320
