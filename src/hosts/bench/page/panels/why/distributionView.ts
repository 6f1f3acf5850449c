import { html, nothing, svg, type TemplateResult } from "lit-html";
import type { Distribution } from "../../../protocol/answers.js";

const width = 300;
const height = 96;

/** The draws as a histogram, the first-order answer as a curve over it, and both in numbers. */
export function distributionView(drawn: Distribution): TemplateResult {
  const { histogram, percentiles, value, upper, lower, unit, draws, rejected, seed } = drawn;
  const { from, to, counts } = histogram;
  const most = Math.max(...counts, 1);
  const across = (x: number) => ((x - from) / (to - from)) * width;
  const bar = width / counts.length;
  const [low2, low1, median, high1, high2] = percentiles;
  const words = (x: number) => figures(x, (high1 - low1) / 2);
  return html`<svg class="panel-histogram" viewBox="0 0 ${width} ${height + 4}" preserveAspectRatio="none" role="img" aria-label=${`Distribution of ${draws} draws: median ${words(median)}, 68 per cent between ${words(low1)} and ${words(high1)} ${unit}`}>
      ${counts.map((count, index) => {
        const tall = (count / most) * height;
        return svg`<rect x=${index * bar} y=${height - tall} width=${Math.max(0.5, bar - 0.5)} height=${tall} />`;
      })}
      <path d=${curve(drawn, most)} />
      <line x1=${across(value)} x2=${across(value)} y1="0" y2=${height} />
    </svg>
    <table class="panel-numbers">
      <thead><tr><td></td><th scope="col">first order</th><th scope="col">drawn</th></tr></thead>
      <tbody class="number">
        <tr><th scope="row">middle</th><td>${words(value)}</td><td>${words(median)}</td></tr>
        <tr><th scope="row">68 %</th><td>${words(value - lower)} to ${words(value + upper)}</td><td>${words(low1)} to ${words(high1)}</td></tr>
        <tr><th scope="row">95 %</th><td>${words(value - 2 * lower)} to ${words(value + 2 * upper)}</td><td>${words(low2)} to ${words(high2)}</td></tr>
      </tbody>
    </table>
    <p class="soft">${draws.toLocaleString("en")} draws, seed ${seed}${unit ? `, in ${unit}` : ""}.${
      rejected > 0
        ? ` ${rejected.toLocaleString("en")} draws fell outside what the function accepts and were left out.`
        : nothing
    }</p>`;
}

/** A normal curve with a width for each side, of the area of the histogram. */
function curve({ histogram, value, upper, lower, draws }: Distribution, most: number): string {
  const { from, to, counts } = histogram;
  if (!(upper > 0) || !(lower > 0)) return "";
  const step = (to - from) / counts.length;
  const peak = (2 * draws * step) / ((upper + lower) * Math.sqrt(2 * Math.PI));
  const points = Array.from({ length: 121 }, (_, index) => {
    const x = from + ((to - from) * index) / 120;
    const away = (x - value) / (x < value ? lower : upper);
    const y = (peak * Math.exp(-0.5 * away * away)) / most;
    return `${(index / 120) * width},${height - Math.min(1.02, y) * height}`;
  });
  return `M${points.join("L")}`;
}

/** As many digits as an uncertainty of this size leaves sense in, and one more. */
function figures(x: number, size: number): string {
  if (!(size > 0)) return x.toPrecision(6);
  const places = Math.max(0, Math.min(12, 1 - Math.floor(Math.log10(size))));
  return Math.abs(x) < 1e7 && places < 9 ? x.toFixed(places) : x.toExponential(4);
}
