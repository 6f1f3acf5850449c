/**
 * Runs what creates an editor view. The view's library writes its rules into a <style> element where a document has a
 * head, which a page that only takes styles from its own files refuses; without one it adopts a sheet made by script,
 * which is allowed, and keeps to that for every later view.
 */
export function adoptStyles<T>(create: () => T): T {
  Object.defineProperty(document, "head", { configurable: true, value: null });
  try {
    return create();
  } finally {
    Reflect.deleteProperty(document, "head");
  }
}
