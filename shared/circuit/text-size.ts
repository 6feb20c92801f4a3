/** Bytes a text takes in UTF-8, without making the bytes. */
export function utf8Length(text: string): number {
  let bytes = 0;
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code < 0x80) bytes += 1;
    else if (code < 0x800) bytes += 2;
    else if (code >= 0xd800 && code < 0xdc00 && i + 1 < text.length) {
      bytes += 4;
      i++;
    } else bytes += 3;
  }
  return bytes;
}

/** '1 MB', '20.4 MB'. */
export function megabytes(bytes: number): string {
  const size = bytes / 1e6;
  return `${Number.isInteger(size) ? size : size.toFixed(size < 0.1 ? 3 : 1)} MB`;
}
