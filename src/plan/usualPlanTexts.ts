/** What is taken where nothing is said. */
export const usualPlanTexts = {
  phases: "quadrature",
  efficiency: "1",
  airmass: "2",
  sun: "-18 deg",
  moon: "0 deg",
  width: "0.1",
  perNight: "1",
  gap: "0 s",
} as const;
