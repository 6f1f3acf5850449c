import { join } from "node:path";

export const answer = join("a", "b");
