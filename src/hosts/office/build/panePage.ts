/**
 * Nothing is loaded but the folder's own files and the host's library, and nothing is sent anywhere. Styles of the
 * host's own library are refused with all other inline ones; it shows nothing in this page.
 */
export const contentSecurityPolicy = [
  "default-src 'none'",
  "script-src 'self' https://appsforoffice.microsoft.com",
  "style-src 'self'",
  "img-src 'self' data:",
  "font-src 'self'",
  "connect-src 'self'",
  "base-uri 'none'",
  "form-action 'none'",
].join("; ");

const head = `
<meta http-equiv="Content-Security-Policy" content="${contentSecurityPolicy}">
<script src="https://appsforoffice.microsoft.com/lib/1/hosted/office.js"></script>
<script src="functions.js" defer></script>
<script src="pane.js" defer></script>
`;

/** The pane's page as it is hosted: also the page of the shared runtime, in which the functions run. */
export function panePage(page: string): string {
  if (!page.includes("<head>")) throw new Error("the pane's page has no <head>");
  return page.replace("<head>", `<head>${head}`);
}
