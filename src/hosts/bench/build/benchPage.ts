import { localPolicy } from "../../localPolicy.js";

const head = `
<meta http-equiv="Content-Security-Policy" content="${localPolicy}">
<link rel="icon" href="icons/barycell.svg" type="image/svg+xml">
<link rel="manifest" href="manifest.webmanifest">
<link rel="stylesheet" href="bench.css">
<script src="main.js" defer></script>
`;

/** The page as it is served. The template holds what is seen of it; what it loads stands here. */
export function benchPage(template: string): string {
  if (!template.includes("<head>")) throw new Error("the template of the page has no <head>");
  return template.replace("<head>", `<head>${head}`);
}
