/** Where the values of one axis lie: `from` at the first pixel, `to` at the last. */
export interface Axis {
  readonly label: string;
  readonly unit: string;
  readonly isLog: boolean;
  readonly from: number;
  readonly to: number;
  /** The values are days from J2000.0, told as dates or as times of the clock. */
  readonly times?: "dates" | "clock";
}

export interface Tick {
  readonly value: number;
  readonly text: string;
}

/** The part of an axis, 0 to 1, at which a value lies. */
export function partOf({ isLog, from, to }: Axis, value: number): number {
  return isLog ? Math.log(value / from) / Math.log(to / from) : (value - from) / (to - from);
}

export function valueAt({ isLog, from, to }: Axis, part: number): number {
  return isLog ? from * (to / from) ** part : from + (to - from) * part;
}

/** An axis around values, with a little room; values that a logarithm cannot take are left out. */
export function axisOver(label: string, unit: string, isLog: boolean, values: Iterable<number>): Axis {
  let [least, most] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const value of values) {
    if (!Number.isFinite(value) || (isLog && value <= 0)) continue;
    if (value < least) least = value;
    if (value > most) most = value;
  }
  if (least > most) return { label, unit, isLog, from: isLog ? 1 : 0, to: isLog ? 10 : 1 };
  if (isLog) {
    const room = least === most ? 2 : (most / least) ** 0.04;
    return { label, unit, isLog, from: least / room, to: most * room };
  }
  const room = least === most ? Math.max(0.5, Math.abs(least) * 0.1) : (most - least) * 0.04;
  return { label, unit, isLog, from: least - room, to: most + room };
}

/** Round values along an axis, at most so many; a logarithmic axis over decades has powers of ten. */
export function ticksOf(axis: Axis, most: number): Tick[] {
  if (axis.isLog && axis.to / axis.from >= 10 ** 1.5) return decades(axis, most);
  const step = roundStep((axis.to - axis.from) / Math.max(1, most));
  const places = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const ticks: Tick[] = [];
  const last = Math.floor(axis.to / step + 1e-9);
  for (let index = Math.ceil(axis.from / step - 1e-9); index <= last; index++) {
    const value = index * step;
    if (!axis.isLog || value > 0) ticks.push({ value, text: numberText(value, places) });
  }
  return ticks;
}

function decades({ from, to }: Axis, most: number): Tick[] {
  const [first, last] = [Math.ceil(Math.log10(from) - 1e-9), Math.floor(Math.log10(to) + 1e-9)];
  const step = Math.max(1, Math.ceil((last - first + 1) / Math.max(1, most)));
  const ticks: Tick[] = [];
  for (let power = first; power <= last; power += step) {
    ticks.push({ value: 10 ** power, text: numberText(10 ** power, Math.max(0, -power)) });
  }
  return ticks;
}

/** 1, 2 or 5 times a power of ten, at least as large as asked. */
function roundStep(size: number): number {
  const power = 10 ** Math.floor(Math.log10(size));
  const lead = size / power;
  return power * (lead <= 1.0000001 ? 1 : lead <= 2.0000001 ? 2 : lead <= 5.0000001 ? 5 : 10);
}

function numberText(value: number, places: number): string {
  const size = Math.abs(value);
  if (value === 0) return "0";
  if (size >= 1e6 || places > 5) {
    const [lead, power] = value.toExponential(6).split("e") as [string, string];
    const digits = Number(lead);
    const small = String(Number(power)).replace(/[-\d]/g, (each) =>
      each === "-" ? "⁻" : ("⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(each)] as string),
    );
    return digits === 1 ? `10${small}` : `${digits}·10${small}`;
  }
  return value.toFixed(Math.min(places, 20)).replace("-", "−");
}
