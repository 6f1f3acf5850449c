import { createEditor } from "./editor/createEditor.js";
import { createGrid } from "./grid/createGrid.js";
import { startBench } from "./startBench.js";

const root = document.getElementById("bench");
if (root) startBench(root, createGrid, createEditor);
