/** A manifest for the place where the add-in's folder is hosted. */
export function fillTemplate(template: string, base: string, version: string): string {
  const { origin, host } = new URL(base);
  const values: Readonly<Record<string, string>> = { base, origin, domain: host, version };
  return template.replace(/\{\{(\w+)\}\}/g, (whole, name: string) => values[name] ?? whole);
}
