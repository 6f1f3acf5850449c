/** Takes light or dark from the host's own colours; without them the page follows the system. */
export function followTheme(): void {
  const colour = Office.context?.officeTheme?.bodyBackgroundColor;
  const channels = /^#?([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})/i.exec(colour ?? "")?.slice(1);
  if (!channels) return;
  const [red, green, blue] = channels.map((channel) => Number.parseInt(channel, 16)) as [number, number, number];
  // Luma of ITU-R BT.601.
  const brightness = 0.299 * red + 0.587 * green + 0.114 * blue;
  document.documentElement.dataset.theme = brightness < 128 ? "dark" : "light";
}
