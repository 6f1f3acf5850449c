/**
 * Asks the browser to keep the sheets even when the disk runs full, and lets the page open without its server, and tells once a newer version lies ready: `takeOver` lets it in, and the page
 * is loaded anew. Where the browser keeps no service worker the page works all the same, with its server.
 */
export async function keepOffline(onNewVersion: (takeOver: () => void) => void): Promise<void> {
  void navigator.storage?.persist?.().catch(() => false);
  const container = navigator.serviceWorker as ServiceWorkerContainer | undefined;
  if (container === undefined) return;
  const isFirst = container.controller === null;
  const registration = await container.register("service-worker.js").catch(() => undefined);
  if (registration === undefined) return;
  const tell = (waiting: ServiceWorker): void =>
    onNewVersion(() => {
      container.addEventListener("controllerchange", () => location.reload(), { once: true });
      waiting.postMessage("take over");
    });
  if (registration.waiting && !isFirst) tell(registration.waiting);
  registration.addEventListener("updatefound", () => {
    const coming = registration.installing;
    coming?.addEventListener("statechange", () => {
      if (coming.state === "installed" && container.controller !== null) tell(coming);
    });
  });
}
