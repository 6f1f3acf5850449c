import type { Figure } from "./draw/figure.js";

/** `note` is what to know beside the figure. */
export type Made = { readonly figure: Figure; readonly note?: string } | { readonly missing: string };
