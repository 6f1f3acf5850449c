/** What the host says about one call, beside its arguments. */
interface Invocation {
  readonly functionName?: string;
  readonly address?: string | null;
  /** Those of an argument that repeats stand in a list of their own. */
  readonly parameterAddresses?: readonly (string | null | readonly (string | null)[])[] | null;
}

/** The arguments of one call as the host hands them over, and where each starts, as far as the host tells. */
export interface HostCall {
  readonly values: readonly unknown[];
  readonly addresses: readonly (string | undefined)[];
}

/** The host puts its account of the call behind the last argument. */
export function hostCall(handedOver: readonly unknown[]): HostCall {
  const last = handedOver.at(-1);
  if (!isInvocation(last)) return { values: handedOver, addresses: [] };
  const addresses = (last.parameterAddresses ?? []).flat().map(firstCell);
  const sheets = new Set(addresses.filter((address) => address !== undefined).map(sheetOf));
  // A message is short, and the sheet says nothing where there is only one.
  const short = sheets.size === 1 ? addresses.map((address) => address && withoutSheet(address)) : addresses;
  return { values: handedOver.slice(0, -1), addresses: short };
}

function isInvocation(value: unknown): value is Invocation {
  return typeof value === "object" && value !== null && !Array.isArray(value) && "functionName" in value;
}

/** "Table!B1:F1" starts at "Table!B1"; what is no address is none. */
function firstCell(address: string | null): string | undefined {
  const first = /^(.*!)?(\$?[A-Z]{1,3}\$?\d+)(:\$?[A-Z]{1,3}\$?\d+)?$/i.exec(address ?? "");
  return first ? `${first[1] ?? ""}${first[2]}` : undefined;
}

function sheetOf(address: string): string {
  return address.slice(0, address.lastIndexOf("!") + 1);
}

function withoutSheet(address: string): string {
  return address.slice(address.lastIndexOf("!") + 1);
}
