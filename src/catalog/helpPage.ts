import { definitions } from "../functions/definitions.js";
import { describeFunction } from "./describeFunction.js";
import { describeUnits } from "./describeUnits.js";

/** All functions and units as one page; the paragraph of REFLEX is at `#REFLEX`. */
export function helpPage(): string {
  const sections = definitions.map((definition) => section(definition.name, describeFunction(definition)));
  const links = definitions.map(({ name, question }) => `<li><a href="#${name}">${name}</a> ${escaped(question)}</li>`);
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'self'; img-src 'self'; base-uri 'none'; form-action 'none'">
<meta name="viewport" content="width=device-width">
<title>Barycell functions</title>
<link rel="icon" href="assets/icon-32.png">
<link rel="stylesheet" href="help.css">
</head>
<body>
<h1>Barycell functions</h1>
<ul>
${links.join("\n")}
<li><a href="#units">units</a> Which units are read, and how?</li>
</ul>
${[...sections, section("units", describeUnits())].join("\n")}
</body>
</html>
`;
}

function section(name: string, lines: readonly string[]): string {
  return `<section id="${name}"><h2>${name}</h2><pre>${escaped(lines.join("\n"))}</pre></section>`;
}

function escaped(text: string): string {
  return text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");
}
