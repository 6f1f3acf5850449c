import { readFile, writeFile } from "node:fs/promises";
import { launchChromium } from "../test/browser/launchChromium.js";

// Draws barycell.svg anew in every size that a manifest names: node --import tsx manifest/drawIcons.ts
const folder = new URL("icons/", import.meta.url);
const colour = await readFile(new URL("barycell.svg", folder), "utf8");
const outline = await readFile(new URL("outline.svg", folder), "utf8");

const browser = await launchChromium();
const page = await browser.newPage();
for (const size of [16, 32, 64, 80, 192]) await draw(colour, size, `icon-${size}.png`);
await draw(outline, 32, "outline-32.png");
await browser.close();

async function draw(svg: string, size: number, name: string): Promise<void> {
  await page.setViewportSize({ width: size, height: size });
  const sized = svg.replace("<svg ", `<svg width="${size}" height="${size}" `);
  await page.setContent(`<style>body{margin:0}svg{display:block}</style>${sized}`);
  await writeFile(new URL(name, folder), await page.screenshot({ omitBackground: true }));
}
