import { spawn } from "node:child_process";

const openers: Readonly<Record<string, readonly [string, ...string[]]>> = {
  darwin: ["open"],
  win32: ["cmd", "/c", "start", '""'],
};

/** Opens an address in the system's own browser; resolves with whether it could be started. */
export function openBrowser(address: string): Promise<boolean> {
  const [opener, ...words] = openers[process.platform] ?? ["xdg-open"];
  return new Promise((resolve) => {
    const child = spawn(opener as string, [...words, address], { stdio: "ignore", detached: true });
    child.once("error", () => resolve(false));
    child.once("spawn", () => {
      child.unref();
      resolve(true);
    });
  });
}
