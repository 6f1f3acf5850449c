import type { Shape, Surface } from "./surface.js";

export interface SvgSurface extends Surface {
  /** The whole file. */
  document(): string;
}

/** Paths and letters as text, for papers and slides: nothing in it is loaded from elsewhere. */
export function svgSurface(width: number, height: number, font: string): SvgSurface {
  const parts: string[] = [];
  let clips = 0;
  return {
    fill: (x, y, wide, high, colour) =>
      void parts.push(
        `<rect x="${n(x)}" y="${n(y)}" width="${n(wide)}" height="${n(high)}" fill="${escaped(colour)}"/>`,
      ),
    line(points, { colour, width, dash }) {
      const path = pathOf(points);
      if (path === "") return;
      const dashes = dash && dash.length > 0 ? ` stroke-dasharray="${dash.join(" ")}"` : "";
      parts.push(`<path d="${path}" fill="none" stroke="${escaped(colour)}" stroke-width="${width}"${dashes}/>`);
    },
    shape(shape, x, y, radius, colour, hollow = false) {
      const isOpen = hollow || shape === "cross" || shape === "plus";
      const paint = isOpen ? `fill="none" stroke="${escaped(colour)}" stroke-width="1.5"` : `fill="${escaped(colour)}"`;
      parts.push(`${outline(shape, x, y, radius)} ${paint}/>`);
    },
    text(text, x, y, { colour, size, align, turned = false }) {
      const turn = turned ? ` transform="rotate(-90 ${n(x)} ${n(y)})"` : "";
      parts.push(
        `<text x="${n(x)}" y="${n(y)}" fill="${escaped(colour)}" font-size="${size}" text-anchor="${align}"${turn}>${escaped(text)}</text>`,
      );
    },
    clip(x, y, wide, high) {
      clips += 1;
      parts.push(
        `<clipPath id="clip${clips}"><rect x="${n(x)}" y="${n(y)}" width="${n(wide)}" height="${n(high)}"/></clipPath><g clip-path="url(#clip${clips})">`,
      );
    },
    release: () => void parts.push("</g>"),
    document: () =>
      `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" font-family="${escaped(font)}">\n${parts.join("\n")}\n</svg>\n`,
  };
}

function pathOf(points: readonly number[] | Float64Array): string {
  let path = "";
  let isDown = false;
  for (let index = 0; index + 1 < points.length; index += 2) {
    const [x, y] = [points[index] as number, points[index + 1] as number];
    if (!Number.isFinite(x) || !Number.isFinite(y)) {
      isDown = false;
      continue;
    }
    path += `${isDown ? "L" : "M"}${n(x)} ${n(y)}`;
    isDown = true;
  }
  return path;
}

function outline(shape: Shape, x: number, y: number, r: number): string {
  const at = (...points: readonly number[]) => pathOf(points);
  switch (shape) {
    case "circle":
      return `<circle cx="${n(x)}" cy="${n(y)}" r="${n(r)}"`;
    case "square":
      return `<rect x="${n(x - 0.9 * r)}" y="${n(y - 0.9 * r)}" width="${n(1.8 * r)}" height="${n(1.8 * r)}"`;
    case "triangle":
      return `<path d="${at(x, y - 1.2 * r, x + 1.1 * r, y + 0.8 * r, x - 1.1 * r, y + 0.8 * r)}Z"`;
    case "diamond":
      return `<path d="${at(x, y - 1.3 * r, x + 1.1 * r, y, x, y + 1.3 * r, x - 1.1 * r, y)}Z"`;
    case "cross":
      return `<path d="${at(x - r, y - r, x + r, y + r)}${at(x - r, y + r, x + r, y - r)}"`;
    case "plus":
      return `<path d="${at(x - 1.2 * r, y, x + 1.2 * r, y)}${at(x, y - 1.2 * r, x, y + 1.2 * r)}"`;
  }
}

function n(value: number): string {
  return String(Math.round(value * 100) / 100);
}

function escaped(text: string): string {
  return text.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");
}
