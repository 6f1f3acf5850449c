import packageData from "../../../package.json" with { type: "json" };

export const version: string = packageData.version;
