/*
 * How a speed becomes a shift, as the number code the kernels take: relativistic for motion along the line of sight,
 * or the linear v/c, which is used for slow motion only.
 */
export const relativistic = 0;
export const linear = 1;

/** Linear model: the greatest |v| / c, and so the greatest |shift|. */
export const greatestLinearShift = 0.1;
