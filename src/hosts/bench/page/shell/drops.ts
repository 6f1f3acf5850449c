/** Opens a file that is dropped anywhere on the page. */
export function takeDrops(root: HTMLElement, open: (file: File) => void): void {
  root.addEventListener("dragover", (event) => {
    if (!event.dataTransfer?.types.includes("Files")) return;
    event.preventDefault();
    root.classList.add("isDroppedOn");
  });
  root.addEventListener("dragleave", (event) => {
    if (event.relatedTarget === null) root.classList.remove("isDroppedOn");
  });
  root.addEventListener("drop", (event) => {
    root.classList.remove("isDroppedOn");
    const [file] = event.dataTransfer?.files ?? [];
    if (!file) return;
    event.preventDefault();
    open(file);
  });
}
