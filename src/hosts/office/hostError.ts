import type { ErrorCode } from "../../call/cell.js";

const codes: readonly ErrorCode[] = ["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"];

/** The code as one of ours; undefined for those that only newer hosts know. */
export function codeOf(text: string): ErrorCode | undefined {
  return codes.find((code) => code === text);
}

/**
 * The host's own error object. Its class is looked up when it is needed: the host may define it after this script has
 * started. A host shows a sentence for #VALUE! and #N/A alone.
 */
export function hostError(code: ErrorCode, message?: string): CustomFunctions.Error {
  const hostCode = code as string as CustomFunctions.ErrorCode;
  return message === undefined || (code !== "#VALUE!" && code !== "#N/A")
    ? new CustomFunctions.Error(hostCode)
    : new CustomFunctions.Error(hostCode, message);
}
