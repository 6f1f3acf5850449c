import { unit } from "../units/unit.js";

export const kernel = unit;
