/** One exposure that is laid on a date. */
export interface Visit {
  /** Place among the targets. */
  readonly target: number;
  /** Date of the night, 0 h [d from J2000.0]. */
  readonly night: number;
  /** The shutter opens, on a whole minute, and closes [d from J2000.0 UTC]. */
  readonly from: number;
  readonly to: number;
  /** Of the middle of the exposure, by the clock at the barycentre. */
  readonly phase: number;
  readonly phaseError: number;
  readonly airmass: number;
  /** [rad] */
  readonly moonDistance: number;
  /** c z_B [m/s]. */
  readonly barycentricSpeed: number;
}
