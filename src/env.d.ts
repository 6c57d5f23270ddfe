/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Opens short transactions as the one who asks. Never wrap `next()` in one: pages stream. */
    db: import('#src/db/client.ts').DatabaseHandle;
    actor: import('#src/auth/actor.ts').Actor;
    /** On the answer as `x-request-id`, in problem documents and in every line of the log. */
    requestId: string;
    log: import('#src/lib/logger.ts').Logger;
  }
}
