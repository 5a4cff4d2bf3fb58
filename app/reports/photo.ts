/** A photo is staged while its form is not yet sent, kept once it belongs to something, removed by its owner. */
export const photoStates = ['staged', 'kept', 'removed'] as const

/** Widths every photo is kept at, in pixels; WebP, and a JPEG of the middle one for mails. */
export const photoWidths = [320, 960, 2048] as const

export const photoLimits = { files: 6, bytes: 25 * 1024 * 1024, pixels: 50e6 }
