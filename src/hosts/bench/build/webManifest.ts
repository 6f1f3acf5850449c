/** What a browser needs to keep the page as a program of its own. */
export function webManifest(version: string): string {
  const manifest = {
    id: "barycell",
    name: "Barycell",
    short_name: "Barycell",
    description: "A worksheet that cannot mix up units, for planning and interpreting radial-velocity work",
    version,
    lang: "en",
    start_url: "./",
    scope: "./",
    display: "standalone",
    background_color: "#1b2a4a",
    theme_color: "#1b2a4a",
    icons: [
      { src: "icons/barycell.svg", sizes: "any", type: "image/svg+xml" },
      { src: "icons/icon-192.png", sizes: "192x192", type: "image/png" },
    ],
  };
  return `${JSON.stringify(manifest, undefined, 1)}\n`;
}
