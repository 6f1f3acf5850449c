/** First and last of what is left of `first` to `last` when `count` are taken out from `at` on; undefined for nothing. */
export function deletedRange(first: number, last: number, at: number, count: number): [number, number] | undefined {
  const end = at + count;
  const newFirst = first < at ? first : first < end ? at : first - count;
  const newLast = last < at ? last : last < end ? at - 1 : last - count;
  return newFirst <= newLast ? [newFirst, newLast] : undefined;
}
