/** What worksheet files can address. */
export const mostRows = 1_048_576;
export const mostColumns = 16_384;
