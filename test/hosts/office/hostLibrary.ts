import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import type { Page } from "playwright-core";

const library = "https://appsforoffice.microsoft.com/lib/1/hosted/";
const folder = fileURLToPath(new URL("../../../node_modules/@microsoft/office-js/dist/", import.meta.url));

/** What a page asked for outside the server it came from. */
export interface Outside {
  readonly asked: string[];
}

/** Answers a page's requests for the host's library from the copy for tests, and refuses all others from outside. */
export async function answerHostLibrary(page: Page): Promise<Outside> {
  const asked: string[] = [];
  await page.route(
    (url) => url.hostname !== "127.0.0.1",
    (route) => {
      const url = route.request().url();
      asked.push(url);
      const path = `${folder}${url.slice(library.length).split("?")[0]}`;
      return url.startsWith(library) && existsSync(path)
        ? route.fulfill({ path, contentType: "text/javascript" })
        : route.abort();
    },
  );
  return { asked };
}
