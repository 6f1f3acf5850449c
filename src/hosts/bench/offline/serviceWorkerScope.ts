/** What the service worker needs of its surroundings: the page's own types know no service worker from inside. */
export interface ServiceWorkerScope {
  readonly registration: { readonly scope: string };
  readonly clients: { claim(): Promise<void> };
  skipWaiting(): Promise<void>;
  addEventListener(type: "install" | "activate", listener: (event: WaitingEvent) => void): void;
  addEventListener(type: "message", listener: (event: WaitingEvent & { readonly data: unknown }) => void): void;
  addEventListener(type: "fetch", listener: (event: FetchingEvent) => void): void;
}

interface WaitingEvent {
  waitUntil(done: Promise<unknown>): void;
}

interface FetchingEvent {
  readonly request: Request;
  respondWith(answer: Promise<Response> | Response): void;
}
