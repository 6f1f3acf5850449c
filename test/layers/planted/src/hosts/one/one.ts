import { two } from "../two/two.js";

export const one = two;
