import { followTheme } from "./followTheme.js";
import { officeWorksheet } from "./officeWorksheet.js";
import { startPane } from "./startPane.js";

void Office.onReady().then(() => {
  followTheme();
  startPane(document.getElementById("pane")!, officeWorksheet);
});
