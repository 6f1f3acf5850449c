/** A name without what two catalogues write differently: blanks at the ends, repeated blanks, capitals, ligatures. */
export function foldName(name: string): string {
  return name.normalize("NFKC").trim().replace(/\s+/g, " ").toLowerCase();
}
