/** The name of a book from that of its file: without folder and ending. */
export function titleOf(name: string): string {
  const bare = name.replace(/^.*[\\/]/, "").replace(/\.[A-Za-z0-9]{1,8}$/, "");
  return bare.trim().slice(0, 200) || "Table";
}
