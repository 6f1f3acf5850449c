export { exportAs } from "./exportAs.js";
export { openFile } from "./openFile.js";
