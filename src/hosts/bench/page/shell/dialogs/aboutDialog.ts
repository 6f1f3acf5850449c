import { html } from "lit-html";
import type { Shell } from "../shell.js";

/** What the page is and where the data are. */
export function aboutDialog({ dialogs }: Shell): void {
  dialogs.open(
    "About this page",
    () => html`<p>Barycell turns the columns of a target table into derived ones, with every unit checked: orbit, reflex speed, wavelength shift, planet mass, and back.</p>
      <p>Everything is calculated in this browser. Books are kept in its storage on this machine and nothing is sent anywhere; the page asks for no network once it is loaded.</p>
      <p>A browser that clears its data clears the books too: save a copy of what matters.</p>`,
  );
}
