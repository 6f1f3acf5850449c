import { standInOffice } from "./standInOffice.js";

// In the page this file stands where the host's own library would be loaded; the address says what the sheet holds.
const { cells, theme } = JSON.parse(decodeURIComponent(location.hash.slice(1)));
const standIn = standInOffice(cells, theme);
Object.assign(globalThis, { Excel: standIn.Excel, Office: standIn.Office, standIn });
