/** More rows than this are told by their number. */
export const mostShown = 100;

export function sigmaText(sigmas: number | undefined): string {
  return sigmas === undefined ? "" : `${signed(sigmas, 2)} σ`;
}

export function partText(relative: number | undefined): string {
  return relative === undefined ? "" : `${signed(100 * relative, 2)} %`;
}

function signed(value: number, digits: number): string {
  const size = Math.abs(value);
  const isFar = size >= 1000 || (size > 0 && size < 0.5 * 10 ** -digits);
  return `${value < 0 ? "−" : "+"}${isFar ? size.toExponential(1) : size.toFixed(digits)}`;
}
