import { openGridBrowser } from "./openGrid.js";

/** Prints how long frames take while a million rows are scrolled: node --import tsx test/hosts/bench/grid/timeFrames.ts */
async function timeFrames(print: (line: string) => void): Promise<void> {
  const browser = await openGridBrowser();
  const { page, close } = await browser.open();
  await page.mouse.move(600, 400);
  const frames = async (what: string, act: () => Promise<void>) => {
    await page.evaluate(() => gridStandIn.frameTimes());
    await act();
    const times = await page.evaluate(() => gridStandIn.frameTimes());
    const gaps = times.slice(1).map((time, index) => time - times[index]!);
    gaps.sort((one, other) => one - other);
    const at = (part: number) => gaps[Math.floor(part * (gaps.length - 1))]!.toFixed(1);
    print(`${what}: ${gaps.length} frames, median ${at(0.5)} ms, 95 % ${at(0.95)} ms, longest ${at(1)} ms`);
  };
  const wheel = (right: number, down: number) => async () => {
    for (let turn = 0; turn < 60; turn++) {
      await page.mouse.wheel(right, down);
      await page.waitForTimeout(16);
    }
  };
  await frames("wheel, 4 rows a turn", wheel(0, 112));
  await frames("wheel, 40 rows a turn", wheel(0, 1120));
  await frames("wheel sideways", wheel(60, 0));
  await page.evaluate(() => {
    gridStandIn.page.late = 30;
  });
  await frames("wheel, cells 30 ms late", wheel(0, 1120));
  await page.evaluate(() => {
    gridStandIn.page.late = undefined;
  });
  await frames("bar dragged through the sheet", async () => {
    for (let part = 0; part < 60; part++) {
      await page.evaluate((part) => {
        const scroller = document.querySelector(".grid-scroll")!;
        scroller.scrollTop = (scroller.scrollHeight * part) / 60;
      }, part);
      await page.waitForTimeout(16);
    }
  });
  const repaint = await page.evaluate(async () => {
    const start = performance.now();
    for (let row = 0; row < 40; row++)
      gridStandIn.page.setCell(row, 1, { text: `${row}`, is: "number", flash: "edited" });
    gridStandIn.page.change({});
    await new Promise<void>((done) => requestAnimationFrame(() => requestAnimationFrame(() => done())));
    return performance.now() - start;
  });
  print(`change to the second frame after it: ${repaint.toFixed(1)} ms`);
  await close();
  await browser.close();
}

await timeFrames((line) => process.stdout.write(`${line}\n`));
