import { first } from "./first.js";

export const second = (): number => first();
