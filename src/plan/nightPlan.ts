import { atan2 } from "../kernel/angle.js";
import { airmassAt } from "../kernel/night/airmass.js";
import { altitudeOf } from "../kernel/night/altitude.js";
import { siderealRate } from "../kernel/night/darkness.js";
import { angleBetween, moonFromSite } from "../kernel/night/moonDistance.js";
import { barycentricSpeed } from "../kernel/sky/barycentricSpeed.js";
import { barycentricTime } from "../kernel/sky/barycentricTime.js";
import type { Limits } from "./limits.js";
import type { Night } from "./nights.js";
import type { Opening, Opportunities } from "./opportunities.js";
import { phaseAt, phaseError } from "./phaseSpans.js";
import type { Site } from "./site.js";
import { vectorOfDate } from "./skyTarget.js";
import type { Visit } from "./visit.js";

const minute = 1 / 1440;
/** Half a second: no limit is met to more than this, and no start falls short of it by rounding. */
const rounding = 1e-9;

interface Busy {
  readonly from: number;
  readonly to: number;
}

/** One night while it is filled: what is laid in it, in the order of time. */
export class NightPlan {
  private readonly busy: Busy[] = [];
  private readonly moon = new Float64Array(3);

  constructor(
    private readonly night: Night,
    /** Place of the night among all. */
    private readonly index: number,
    private readonly site: Site,
    private readonly limits: Limits,
    private readonly all: readonly Opportunities[],
  ) {}

  /** Lays what it can, and tells the targets so. */
  fill(): Visit[] {
    const visits: Visit[] = [];
    const open = this.all.flatMap((one, target) => (one.openings[this.index]!.length > 0 ? [target] : []));
    for (let round = 0; round < this.limits.perNight; round++) {
      const before = visits.length;
      for (const target of this.inTurn(open)) {
        const visit = this.lay(target, round === 0);
        if (visit) visits.push(visit);
      }
      if (visits.length === before) break;
    }
    for (const target of open) this.all[target]!.nightsLeft--;
    return visits.sort((a, b) => a.from - b.from);
  }

  /** Those that need visits, the one with the fewest spare nights first. */
  private inTurn(open: readonly number[]): number[] {
    const spare = ({ nightsLeft, target, laid }: Opportunities) =>
      nightsLeft * this.limits.perNight - (target.visits - laid);
    return open
      .filter((index) => this.all[index]!.laid < this.all[index]!.target.visits)
      .sort((a, b) => {
        const [one, other] = [this.all[a]!, this.all[b]!];
        return spare(one) - spare(other) || other.target.value - one.target.value || a - b;
      });
  }

  private lay(index: number, isFirst: boolean): Visit | undefined {
    const one = this.all[index]!;
    const { exposure, overhead } = one.target;
    const star = vectorOfDate(one.vector, this.night);
    const start = this.startOf(one, star);
    if (start === "Moon") {
      if (isFirst) one.nightsMoonlit++;
      return undefined;
    }
    if (start === undefined) return undefined;
    const { from, phase } = start;
    this.busy.push({ from, to: from + exposure + overhead });
    this.busy.sort((a, b) => a.from - b.from);
    one.laid++;
    one.laidAt[phase] = (one.laidAt[phase] ?? 0) + 1;
    one.lastEnd = from + exposure + overhead;
    return this.visitAt(index, from, star);
  }

  /** The minute to open the shutter: at the phase that had fewest visits, nearest to the highest point. */
  private startOf(one: Opportunities, star: Float64Array): { from: number; phase: number } | "Moon" | undefined {
    const openings = one.openings[this.index]!.filter(({ phase }) => !this.hasShare(one, phase));
    const phases = [...new Set(openings.map(({ phase }) => phase))].sort(
      (a, b) => (one.laidAt[a] ?? 0) - (one.laidAt[b] ?? 0) || a - b,
    );
    const highest = this.highestOf(star) - one.target.exposure / 2;
    let moonlit = false;
    for (const phase of phases) {
      const starts = openings
        .filter((opening) => opening.phase === phase)
        .flatMap((opening) => this.startsIn(opening, one))
        .sort((a, b) => Math.abs(a - highest) - Math.abs(b - highest) || a - b);
      const from = starts.find((start) => this.isMoonFar(start, one.target.exposure, star));
      if (from !== undefined) return { from, phase };
      moonlit ||= starts.length > 0;
    }
    return moonlit ? "Moon" : undefined;
  }

  /** A phase with its share of the visits waits for the others while there are nights to spare. */
  private hasShare({ target, laid, laidAt, nightsLeft }: Opportunities, phase: number): boolean {
    const share = Math.ceil(target.visits / Math.max(1, target.phases.length));
    const missing = target.visits - laid;
    return (laidAt[phase] ?? 0) >= share && nightsLeft * this.limits.perNight >= 2 * missing;
  }

  /** The first and the last minute of each free stretch of an opening. */
  private startsIn({ from, to }: Opening, one: Opportunities): number[] {
    const length = one.target.exposure + one.target.overhead;
    const starts: number[] = [];
    let free = Math.max(from, one.lastEnd + this.limits.gap);
    for (const busy of [...this.busy, { from: Number.POSITIVE_INFINITY, to: Number.POSITIVE_INFINITY }]) {
      const first = this.minuteAfter(free);
      const last = this.minuteBefore(Math.min(to, busy.from - length));
      if (first <= last + rounding) starts.push(first, last);
      free = Math.max(free, busy.to);
      if (free > to) break;
    }
    return starts;
  }

  /** Minutes are counted from the date, so that they come out whole on the clock. */
  private minuteAfter(time: number): number {
    return this.night.date + Math.ceil((time - this.night.date - rounding) / minute) * minute;
  }

  private minuteBefore(time: number): number {
    return this.night.date + Math.floor((time - this.night.date + rounding) / minute) * minute;
  }

  private siderealAt(time: number): number {
    return this.night.sidereal + siderealRate * (time - this.night.midnight);
  }

  /** When the star culminates, within half a day of midnight. */
  private highestOf(star: Float64Array): number {
    const turn = 2 * Math.PI;
    const hour = this.night.sidereal - atan2(star[1]!, star[0]!);
    return this.night.midnight - (hour - turn * Math.round(hour / turn)) / siderealRate;
  }

  private moonAt(time: number): Float64Array {
    moonFromSite(time, this.siderealAt(time), this.site.latitude, this.moon);
    return this.moon;
  }

  private isMoonFar(from: number, exposure: number, star: Float64Array): boolean {
    if (this.limits.moonDistance <= 0) return true;
    return [from, from + exposure / 2, from + exposure].every((time) => {
      const moon = this.moonAt(time);
      const isUp = altitudeOf(moon, this.siderealAt(time), this.site.latitude) > 0;
      return !isUp || angleBetween(star, moon) >= this.limits.moonDistance;
    });
  }

  private visitAt(index: number, from: number, star: Float64Array): Visit {
    const { target } = this.all[index]!;
    const { rightAscension, declination } = target;
    const { latitude, longitude, height } = this.site;
    const middle = from + target.exposure / 2;
    const atBarycentre = barycentricTime(middle, rightAscension, declination, longitude, latitude, height);
    return {
      target: index,
      night: this.night.date,
      from,
      to: from + target.exposure,
      phase: phaseAt(target, atBarycentre),
      phaseError: phaseError(target, atBarycentre),
      airmass: airmassAt(altitudeOf(star, this.siderealAt(middle), latitude)),
      moonDistance: angleBetween(star, this.moonAt(middle)),
      barycentricSpeed: barycentricSpeed(middle, rightAscension, declination, longitude, latitude, height),
    };
  }
}
