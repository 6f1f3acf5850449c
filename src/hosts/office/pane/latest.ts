/** Of several answers that are waited for at once, only the one asked for last counts. */
export function latest(): <T>(answer: Promise<T>, use: (value: T) => void) => Promise<void> {
  let asked = 0;
  return async (answer, use) => {
    const own = ++asked;
    const value = await answer;
    if (own === asked) use(value);
  };
}
