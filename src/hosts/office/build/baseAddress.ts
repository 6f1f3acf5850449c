/** Where the add-in's folder is hosted, from what was asked for; without a slash at the end. */
export function baseAddress(asked: string | undefined): string {
  const text = asked ?? "https://localhost:3443";
  const url = URL.canParse(text) ? new URL(text) : undefined;
  if (url?.protocol !== "https:" || url.search || url.hash || /["'<>&\s]/.test(text)) {
    throw new Error(
      `base is "${text}"; give the https address of the folder, for example https://tools.example.org/barycell`,
    );
  }
  return url.href.replace(/\/+$/, "");
}
