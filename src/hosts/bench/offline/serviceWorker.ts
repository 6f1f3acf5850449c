import type { ServiceWorkerScope } from "./serviceWorkerScope.js";

/** Put in front by the build: every file of the page with its digest. */
declare const keptFiles: Readonly<Record<string, string>>;

const worker = self as unknown as ServiceWorkerScope;
const prefix = "barycell ";
const cacheName = prefix + Object.values(keptFiles).join(" ");

worker.addEventListener("install", (event) => event.waitUntil(keepAll()));

worker.addEventListener("activate", (event) => event.waitUntil(forgetOthers().then(() => worker.clients.claim())));

worker.addEventListener("message", (event) => {
  if (event.data === "take over") event.waitUntil(worker.skipWaiting());
});

worker.addEventListener("fetch", (event) => {
  const { request } = event;
  if (!request.url.startsWith(worker.registration.scope)) {
    event.respondWith(Response.error());
    return;
  }
  const name = new URL(request.url).pathname.slice(new URL(worker.registration.scope).pathname.length) || "index.html";
  if (request.method === "GET" && Object.hasOwn(keptFiles, name)) event.respondWith(kept(name));
});

/** All files of one version or none of them: a file that is not the one the build made fails the whole. */
async function keepAll(): Promise<void> {
  const cache = await caches.open(cacheName);
  await Promise.all(
    Object.entries(keptFiles).map(async ([name, integrity]) => {
      const answer = await fetch(addressOf(name), { cache: "no-store", integrity });
      if (!answer.ok) throw new Error(`${name}: ${answer.status}`);
      await cache.put(addressOf(name), answer);
    }),
  );
}

async function forgetOthers(): Promise<void> {
  for (const name of await caches.keys()) {
    if (name.startsWith(prefix) && name !== cacheName) await caches.delete(name);
  }
}

async function kept(name: string): Promise<Response> {
  const cache = await caches.open(cacheName);
  return (await cache.match(addressOf(name))) ?? fetch(addressOf(name));
}

function addressOf(name: string): string {
  return new URL(name, worker.registration.scope).href;
}
