/** Where the telescope stands: geodetic [rad], east and north positive; height above the ellipsoid [m]. */
export interface Site {
  readonly longitude: number;
  readonly latitude: number;
  readonly height: number;
}
