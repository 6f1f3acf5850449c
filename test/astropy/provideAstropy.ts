import { execFileSync } from "node:child_process";

/** How to get what the tests of this folder need. */
export const howToInstall = "needs Debian's python3-astropy: apt-get install python3-astropy";

const candidates = [process.env.PYTHON_WITH_ASTROPY, "/usr/bin/python3", "python3"];

function findAstropy(): string | undefined {
  return candidates.find((python) => {
    if (!python) return false;
    try {
      execFileSync(python, ["-c", "import astropy"], { stdio: "ignore" });
      return true;
    } catch {
      return false;
    }
  });
}

/**
 * A Python that has astropy, a general library of astronomy to compare with. Where a build of ours runs (CI is set) on a
 * Debian that lets us, it is installed; elsewhere the tests that need it are skipped, which is said.
 */
export function provideAstropy(): string | undefined {
  const found = findAstropy();
  if (found || !process.env.CI || process.getuid?.() !== 0 || process.platform !== "linux") return found;
  try {
    const quiet = { env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" }, stdio: "ignore" } as const;
    execFileSync("apt-get", ["update", "-qq"], quiet);
    execFileSync("apt-get", ["install", "-y", "-qq", "--no-install-recommends", "python3-astropy"], quiet);
  } catch {
    return undefined;
  }
  return findAstropy();
}
