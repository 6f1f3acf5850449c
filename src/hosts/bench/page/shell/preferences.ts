import type { Preferences } from "../page.js";

const keptName = "barycell.preferences";

const usual: Preferences = { theme: "system", flash: true, panel: "why", panelWidth: 352, plots: false };

/** What this browser was told before; storage that is denied leaves the usual ones. */
export function readPreferences(): Preferences {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(keptName) ?? "{}");
    return typeof kept === "object" && kept !== null
      ? { ...usual, ...onlyKnown(kept as Record<string, unknown>) }
      : usual;
  } catch {
    return usual;
  }
}

export function keepPreferences(preferences: Preferences): void {
  try {
    localStorage.setItem(keptName, JSON.stringify(preferences));
  } catch {
    // The page works without; they hold until it is closed.
  }
}

function onlyKnown(kept: Record<string, unknown>): Partial<Preferences> {
  const { theme, flash, panel, panelWidth, plots } = kept;
  return {
    ...(theme === "light" || theme === "dark" || theme === "red" ? { theme } : {}),
    ...(typeof flash === "boolean" ? { flash } : {}),
    ...(typeof panel === "string" ? { panel } : {}),
    ...(typeof panelWidth === "number" && panelWidth >= 200 && panelWidth <= 2000 ? { panelWidth } : {}),
    ...(typeof plots === "boolean" ? { plots } : {}),
  };
}

/** Puts a theme on; the system's own is followed where none was chosen. */
export function wearTheme(theme: Preferences["theme"]): void {
  if (theme === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}
