export const plotKinds = ["columns", "signal", "phase", "dates", "hours", "visibility", "night", "revision"] as const;
export type PlotKind = (typeof plotKinds)[number];

/** Kinds that are about the selected or the marked rows. */
export const kindsOfRows: readonly PlotKind[] = ["phase", "dates", "visibility", "night"];
/** Kinds that share the site, the dates and the limits of the plan. */
export const kindsOfPlan: readonly PlotKind[] = ["dates", "hours", "visibility", "night"];

/** What one plot shows; columns are known by their headers, so that they are found again after they moved. */
export interface PlotSettings {
  readonly kind: PlotKind;
  readonly x: string;
  readonly y: string;
  readonly colour: string;
  readonly xLog: boolean;
  readonly yLog: boolean;
  readonly errors: boolean;
  /** A value of y, as typed; empty for none. */
  readonly level: string;
  /** The evening's date of the night that is seen, as typed; empty for the first of the plan. */
  readonly night: string;
  /** The id of a ledger; empty for the latest. */
  readonly ledger: string;
}

export const usualSettings: PlotSettings = {
  kind: "signal",
  x: "",
  y: "",
  colour: "",
  xLog: false,
  yLog: false,
  errors: true,
  level: "",
  night: "",
  ledger: "",
};

const keptName = "barycell.plot";

export function readSettings(): PlotSettings {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(keptName) ?? "{}");
    if (typeof kept !== "object" || kept === null) return usualSettings;
    const known = Object.entries(usualSettings).map(([name, usual]) => {
      const value = (kept as Record<string, unknown>)[name];
      return [name, typeof value === typeof usual ? value : usual];
    });
    const settings = Object.fromEntries(known) as PlotSettings;
    return plotKinds.includes(settings.kind) ? settings : { ...settings, kind: usualSettings.kind };
  } catch {
    return usualSettings;
  }
}

const listeners = new Set<(change: Partial<PlotSettings>) => void>();

/** Another part of the page asks for a plot, before or after the first one is drawn. */
export function askForPlot(change: Partial<PlotSettings>): void {
  keepSettings({ ...readSettings(), ...change });
  for (const listener of listeners) listener(change);
}

export function onPlotAsked(listener: (change: Partial<PlotSettings>) => void): void {
  listeners.add(listener);
}

export function keepSettings(settings: PlotSettings): void {
  try {
    localStorage.setItem(keptName, JSON.stringify(settings));
  } catch {
    // They hold until the page is closed.
  }
}
