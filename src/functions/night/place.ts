import { required } from "../definition.js";
import * as quantity from "../quantities.js";

/** A star as a site sees it. */
export const starAtSite = [
  required(quantity.rightAscension),
  required(quantity.declination),
  required(quantity.longitude),
  required(quantity.latitude),
] as const;

export const placeNote = "Give RA and dec at the time itself: a fast star moves out of 0.01 deg in some years.";
