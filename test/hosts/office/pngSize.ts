/** Width and height of a PNG image, from its header chunk (ISO/IEC 15948, 11.2.2). */
export function pngSize(file: Buffer): { readonly width: number; readonly height: number } {
  if (file.toString("latin1", 1, 4) !== "PNG" || file.toString("latin1", 12, 16) !== "IHDR") {
    return { width: 0, height: 0 };
  }
  return { width: file.readUInt32BE(16), height: file.readUInt32BE(20) };
}
