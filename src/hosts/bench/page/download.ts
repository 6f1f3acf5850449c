/** How long a browser may take to begin reading what it is given to save [ms]. */
const kept = 60_000;

/** Lets the browser save a file under a name. */
export function download(name: string, content: Blob): void {
  const address = URL.createObjectURL(content);
  const link = document.createElement("a");
  link.href = address;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), kept);
}
