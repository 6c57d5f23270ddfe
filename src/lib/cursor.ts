/** Cursors of lists: the sort key and id of the last row, opaque to callers. */

/** The place after which the next page starts. */
export interface Cursor {
  readonly sortKey: string;
  readonly id: string;
}

export function encodeCursor({ sortKey, id }: Cursor): string {
  return Buffer.from(JSON.stringify([sortKey, id]), 'utf8').toString('base64url');
}

/** Null where the text is not a cursor of ours. */
export function decodeCursor(text: string): Cursor | null {
  try {
    const parts: unknown = JSON.parse(Buffer.from(text, 'base64url').toString('utf8'));
    if (!Array.isArray(parts) || parts.length !== 2) return null;
    const [sortKey, id] = parts as readonly unknown[];
    return typeof sortKey === 'string' && typeof id === 'string' ? { sortKey, id } : null;
  } catch {
    return null;
  }
}
