import { answer } from "../call/answer.js";

export const upward = answer;
