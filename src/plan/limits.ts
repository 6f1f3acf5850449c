/** What a visit has to keep. */
export interface Limits {
  /** The exposure lies at this airmass or less, */
  readonly airmass: number;
  /** in the dark: with the Sun below this altitude [rad], */
  readonly sunBelow: number;
  /** its middle and the standard uncertainty of its phase together no farther than this from a phase that is wanted, */
  readonly phaseWidth: number;
  /** and with the Moon, while it is up, no nearer than this [rad]. */
  readonly moonDistance: number;
  /** A target is visited at most so often in one night, */
  readonly perNight: number;
  /** and at least so long after the end of its last visit [d]. */
  readonly gap: number;
}
