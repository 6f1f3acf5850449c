import type { ColumnRequest } from "./columnRequest.js";

/** The main job over the demo table: orbit, reflex speed, shift, nm, pixels, and back to a mass. */
export const demoColumns: readonly ColumnRequest[] = [
  { header: "Axis [AU]", formula: '=BARY.AXIS(B2,C2,E2,"d; solMass; jupiterMass",I$1)' },
  { header: "K [m/s]", formula: "=BARY.REFLEX(B2,C2:D2,E2:F2,G2,H2,B$1:H$1,J$1)" },
  { header: "Shift", formula: "=BARY.SHIFT(J2,,J$1)" },
  { header: "Line shift at 550 nm [nm]", formula: '=BARY.LINESHIFT("550 nm",J2,,"nm; m/s",M$1)' },
  { header: "Shift on detector [pixel]", formula: '=BARY.PIXELSHIFT(J2,115000,3.2,"m/s; 1; pixel",N$1)' },
  { header: "Minimum mass [earthMass]", formula: '=BARY.MINMASS(J2,B2,C2,G2,"m/s; d; solMass; 1",O$1)' },
];
