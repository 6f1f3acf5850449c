/** What stands in the last square brackets of a header, as it is written; undefined where it has none. */
export function unitInBrackets(header: string): string | undefined {
  return /\[((?:[^[\]]|\[[^[\]]*\])*)\][^[\]]*$/.exec(header)?.[1]?.trim();
}
