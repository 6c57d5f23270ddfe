/** The part of Astro's context that API handlers use: tests call handlers as functions with just this. */
export interface ApiContext {
  readonly request: Request;
  readonly url: URL;
  readonly params: Readonly<Record<string, string | undefined>>;
  readonly locals: App.Locals;
}

export type ApiHandler = (context: ApiContext) => Promise<Response>;
