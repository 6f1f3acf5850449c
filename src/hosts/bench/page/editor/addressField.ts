import type { Grid } from "../grid/grid.js";
import type { Page } from "../page.js";
import { attempt } from "./attempt.js";

export interface AddressField {
  show(address: string): void;
}

/** The address of the active cell; another one, or a name, typed into it is gone to. */
export function createAddressField(line: HTMLElement, page: Page, grid: Grid): AddressField {
  const field = document.createElement("input");
  field.className = "editor-address";
  field.setAttribute("aria-label", "Go to a cell or name");
  field.spellcheck = false;
  field.autocomplete = "off";
  line.append(field);
  let shown = "";

  const restore = () => {
    field.value = shown;
  };
  async function go(): Promise<void> {
    const wanted = field.value.trim();
    if (wanted === "" || wanted === shown) return grid.focus();
    const area = await page.bench.placeOf(wanted, page.sheet());
    if (!area) {
      page.announce(`Nothing is called ${wanted}; an address such as H12, a name or a target's name is needed.`);
      return field.select();
    }
    restore();
    page.select(area, undefined, { reveal: true, focus: true });
    grid.focus();
  }
  field.addEventListener("focus", () => field.select());
  field.addEventListener("blur", restore);
  field.addEventListener("keydown", (event) => {
    if (event.isComposing || (event.key !== "Enter" && event.key !== "Escape")) return;
    event.preventDefault();
    event.stopPropagation();
    if (event.key === "Enter") return attempt(page, go);
    restore();
    grid.focus();
  });
  return {
    show(address) {
      shown = address;
      if (document.activeElement !== field) restore();
    },
  };
}
