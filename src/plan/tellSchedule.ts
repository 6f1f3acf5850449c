import type { Schedule } from "./schedule.js";
import type { Reason, Shortfall } from "./shortfall.js";
import { hoursText } from "./tellChoice.js";

/** What was laid, in one sentence. */
export function tellSchedule({ visits, hours, nights, darkHours, shortfalls }: Schedule, targets: number): string {
  const reached = targets - shortfalls.length;
  return `${visits.length} ${visits.length === 1 ? "visit" : "visits"} in ${hoursText(hours)}; ${nightsText(nights)} with ${hoursText(darkHours)} of darkness; ${reached} of ${targets} targets have all their visits.`;
}

/** A target that has fewer visits than it needs, why, and what would help. */
export function tellShortfall(shortfall: Shortfall): string {
  return `${shortfall.name}: ${tellVisitsLacking(shortfall)}`;
}

/** The same without its name. */
export function tellVisitsLacking({ visits, laid, reason }: Shortfall): string {
  return `${laid} of ${visits} visits; ${reasonText(reason)}.`;
}

function reasonText(reason: Reason): string {
  switch (reason.about) {
    case "never up":
      return "it never stands within the airmass limit in the dark for a whole exposure; look for other dates or a greater airmass";
    case "phase lost":
      return `its phase is lost, uncertain by ${reason.error.toPrecision(2)} of a period at best; measure its times anew, or ask for any phase`;
    case "no phase":
      return "no phase that is wanted falls into its dark hours; look for other dates, or allow a greater width";
    case "Moon":
      return `the Moon was too near in ${nightsText(reason.nights)}; allow a smaller distance`;
    case "few nights":
      return `it can be visited in ${nightsText(reason.nights)} only; look for more dates, or allow more visits a night`;
    case "nights taken":
      return `others took its time, ${nightsText(reason.nights)} would do; plan fewer targets, or more dates`;
  }
}

function nightsText(nights: number): string {
  return nights === 1 ? "1 night" : `${nights} nights`;
}
