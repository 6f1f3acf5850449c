import { readFileSync } from "node:fs";
import { createRequire } from "node:module";

const manifestPackage = createRequire(import.meta.url).resolve("@microsoft/app-manifest");
const text = readFileSync(
  manifestPackage.replace(/index\.js$/, "json-schemas/teams/v1.30/MicrosoftTeams.schema.json"),
  "utf8",
);
// The published file starts with a byte order mark and has two escapes that JSON does not know.
const schema = JSON.parse(
  text
    .replace(/^\uFEFF/, "")
    .replace(/\\a/g, "\\u0007")
    .replace(/\\v/g, "\\u000b"),
);

interface Check {
  (value: unknown): boolean;
  readonly errors?: readonly { readonly instancePath: string; readonly message?: string }[] | null;
}
interface Schemas {
  compile(schema: unknown): Check;
}

// The validator is the one that the package with the schema depends on.
const require = createRequire(manifestPackage);
const { default: Schemas } = require("ajv-draft-04") as { default: new (options: object) => Schemas };
const { default: addFormats } = require("ajv-formats") as { default: (schemas: Schemas, formats: string[]) => void };

const compiled = new Map<string | undefined, Check>();

/** What the host's published schema of manifests has against a value as one of its definitions, or as a whole manifest. */
export function schemaProblems(definition: string | undefined, value: unknown): string[] {
  const check = compiled.get(definition) ?? compile(definition);
  compiled.set(definition, check);
  return check(value) ? [] : (check.errors ?? []).map(({ instancePath, message }) => `${instancePath} ${message}`);
}

function compile(definition: string | undefined): Check {
  const schemas = new Schemas({ strict: false, allErrors: true });
  addFormats(schemas, ["uri", "email", "regex"]);
  const { definitions } = schema;
  return schemas.compile(definition === undefined ? schema : { definitions, ...definitions[definition] });
}
