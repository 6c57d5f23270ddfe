/** Who is asking. Accounts come with groups; until then everybody is a visitor. */
export interface Actor {
  readonly kind: 'visitor';
}

export const visitor: Actor = { kind: 'visitor' };

/** What the database is told of the asker (`wl.actor`); policies will compare it with the owner of a row. A visitor is nobody. */
export function actorKey(_actor: Actor): string {
  return '';
}
