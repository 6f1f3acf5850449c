import { second } from "./second.js";

export const first = (): number => second();
