import type { Night } from "./nights.js";
import type { Site } from "./site.js";
import { type SkyTarget, skyVector, spansUp } from "./skyTarget.js";

/** Hours [h] in the dark above an altitude [rad], a row a target and a column a night. */
export function visibility(
  targets: readonly SkyTarget[],
  nights: readonly Night[],
  site: Site,
  lowest: number,
): Float64Array[] {
  return targets.map((target) => {
    const vector = skyVector(target);
    return Float64Array.from(nights, (night) =>
      spansUp(vector, night, site, lowest).reduce((sum, { from, to }) => sum + 24 * (to - from), 0),
    );
  });
}
