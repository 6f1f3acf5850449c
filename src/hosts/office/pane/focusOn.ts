/** Takes the keyboard and the eye to another element, after a change of view that took away the one in focus. */
export function focusOn(id: string): void {
  window.scrollTo(0, 0);
  document.getElementById(id)?.focus({ preventScroll: true });
}
