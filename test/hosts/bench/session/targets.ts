/** Invented targets around a Jupiter that goes around a Sun. */
const targets = `Name,Period [d],Star mass [solMass],Star mass sigma [solMass],Planet mass [jupiterMass],Planet mass sigma [jupiterMass],Visits
Harbour,4332.589,1,0.02,1,0.01,12
Tiller,11.5,0.9,0.03,0.05,0.004,30
Spar,300,1.2,0.05,3,0.2,7
Keel,1.5,0.5,0.02,0.01,0.001,55
Beacon,40.25,1.1,0.04,0.2,0.01,21
`;

/** The same as a file that is chosen. */
export const targetsFile = { name: "targets.csv", mimeType: "text/csv", buffer: Buffer.from(targets) };

/** Star masses as another program would put them on the clipboard. */
export const revisedMasses = "1.04\n0.95\n1.1\n0.52\n1.1\n";

/**
 * K of these [m/s]: (2 pi G / P)^(1/3) m / (M + m)^(2/3) for a circular orbit seen edge on, computed with 50 digits
 * from the nominal values of IAU 2015 Resolution B3 (GM_sun = 1.3271244e20, GM_jup = 1.2668653e17 m^3/s^2).
 */
export const amplitudes: Readonly<Record<string, number>> = {
  Harbour: 12.4590800916884,
  Tiller: 4.82953247189048,
  Spar: 80.5281886905832,
  Keel: 2.81835335985398,
  Beacon: 11.1294590767572,
};

/** The same with the revised star masses. */
export const revisedAmplitudes: Readonly<Record<string, number>> = {
  Harbour: 12.1378296574879,
  Tiller: 4.65856151539645,
  Spar: 85.3252651510114,
  Keel: 2.74561789195988,
  Beacon: 11.1294590767572,
};

/**
 * By how many of its own uncertainties K moves with the revised star masses; at first order
 * (sigma_K / K)^2 = (sigma_m / m (1 - 2 m / 3 (M + m)))^2 + (2 sigma_M / 3 (M + m))^2, the derivatives of the formula
 * above, computed in double precision.
 */
export const movedSigmas: Readonly<Record<string, string>> = {
  Harbour: "−1.55 σ",
  Tiller: "−0.43 σ",
  Spar: "+0.83 σ",
  Keel: "−0.25 σ",
};
