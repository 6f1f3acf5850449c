import { readFileSync, writeFileSync } from "node:fs";
import Papa from "papaparse";

const [input, output] = process.argv.slice(2);
writeFileSync(output, Papa.unparse(Papa.parse(readFileSync(input, "utf8")).data));
