import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decodeCursor, encodeCursor } from '#src/lib/cursor.ts';

describe('a cursor', () => {
  it('comes back as it was, for any sort key and id, and is safe in an address', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), fc.string(), (sortKey, id) => {
        const text = encodeCursor({ sortKey, id });
        expect(text).toMatch(/^[\w-]+$/);
        expect(decodeCursor(text)).toEqual({ sortKey, id });
      }),
    );
  });

  it.each(['', 'x', 'WyJhIl0', 'W10', 'bnVsbA', 'WzEsMl0', '{"a":1}'])(
    'is refused when it is not ours: %j',
    (text) => {
      expect(decodeCursor(text)).toBeNull();
    },
  );
});
