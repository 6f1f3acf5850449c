/** How to try the add-in that this machine serves. */
export function sideloadText(base: string, manifest: string, certificate: string): string {
  return `
Barycell is served at ${base}; leave this running. The manifest is
  ${manifest}

1. Trust the certificate, once: open ${base}/help.html in the browser and accept it; for a desktop
   program add ${certificate}
   to the trusted root certificates of the system.
2. On the web: Home > Add-ins > More add-ins > My add-ins > Manage my add-ins > Upload my add-in.
   Windows: put the manifest into a shared folder, add that folder under File > Options > Trust Center > Trust Center
   settings > Trusted add-in catalogs with "show in menu", start again, then Home > Add-ins > Shared folder.
   Mac: copy the manifest to the folder that README.md names, start again, then Home > Add-ins.
3. Type =BARY. in a cell.
`;
}
