import { X509Certificate } from "node:crypto";
import { chmod, mkdir, readFile, writeFile } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { generate } from "selfsigned";

export interface Certificate {
  readonly key: string;
  readonly cert: string;
  /** Where the certificate stands, for whoever has to trust it. */
  readonly path: string;
}

const folder = fileURLToPath(new URL("../../../../node_modules/.cache/barycell/", import.meta.url));
const day = 86_400_000;

/** The certificate with which this machine serves itself: made once, and again when it has run out. */
export async function localhostCertificate(now: Date = new Date(), at: string = folder): Promise<Certificate> {
  const [path, keyPath] = [`${at}localhost.crt`, `${at}localhost.key`];
  const known = await Promise.all([readFile(path, "utf8"), readFile(keyPath, "utf8")]).catch(() => undefined);
  if (known && isValid(known[0], now)) return { cert: known[0], key: known[1], path };
  const made = await generate([{ name: "commonName", value: "localhost" }], {
    keySize: 2048,
    algorithm: "sha256",
    notBeforeDate: new Date(now.getTime() - day),
    notAfterDate: new Date(now.getTime() + 365 * day),
    extensions: [
      { name: "basicConstraints", cA: true, critical: true },
      { name: "keyUsage", keyCertSign: true, digitalSignature: true, keyEncipherment: true, critical: true },
      { name: "extKeyUsage", serverAuth: true },
      {
        name: "subjectAltName",
        altNames: [
          { type: 2, value: "localhost" },
          { type: 7, ip: "127.0.0.1" },
        ],
      },
    ],
  });
  await mkdir(at, { recursive: true });
  await writeFile(keyPath, made.private, { mode: 0o600 });
  await chmod(keyPath, 0o600);
  await writeFile(path, made.cert);
  return { cert: made.cert, key: made.private, path };
}

function isValid(cert: string, now: Date): boolean {
  const time = now.getTime();
  const { validFrom, validTo } = new X509Certificate(cert);
  return Date.parse(validFrom) <= time && time + day < Date.parse(validTo);
}
