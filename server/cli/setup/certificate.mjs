import { X509Certificate } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { hostname, networkInterfaces } from 'node:os';
import { join } from 'node:path';

const YEARS = 2; // browsers refuse certificates that are good for much longer
const DAY = 24 * 60 * 60_000; // ms

/** This computer's addresses in its own network: where tablets reach it. */
export function networkAddresses() {
  return Object.values(networkInterfaces()).flatMap((all) => all ?? []).filter(({ family, internal }) => family === 'IPv4' && !internal).map(({ address }) => address);
}

/**
 * The certificate for serving the shop's network over https, kept in the data folder; made anew where there is none,
 * where it runs out within a month, or where this computer has an address that it does not name.
 */
export async function shopCertificate(folder) {
  const at = join(folder, 'certificate');
  const [certFile, keyFile] = [join(at, 'tallyrail.crt'), join(at, 'tallyrail.key')];
  const addresses = ['127.0.0.1', ...networkAddresses()];
  if (!existsSync(certFile) || !existsSync(keyFile) || !isGood(readFileSync(certFile, 'utf8'), addresses)) {
    const { generate } = await import('selfsigned');
    const names = ['localhost', hostname()];
    const made = await generate([{ name: 'commonName', value: 'Tallyrail in this shop' }], {
      algorithm: 'sha256', keySize: 2048, notAfterDate: new Date(Date.now() + YEARS * 365 * DAY),
      extensions: [
        { name: 'basicConstraints', cA: true, critical: true }, // a tablet takes it into its list of trusted authorities
        { name: 'keyUsage', digitalSignature: true, keyEncipherment: true, keyCertSign: true, critical: true },
        { name: 'extKeyUsage', serverAuth: true },
        { name: 'subjectAltName', altNames: [...names.map((value) => ({ type: 2, value })), ...addresses.map((ip) => ({ type: 7, ip }))] },
      ],
    });
    mkdirSync(at, { recursive: true, mode: 0o700 });
    writeFileSync(keyFile, made.private, { mode: 0o600 });
    writeFileSync(certFile, made.cert);
  }
  return { cert: readFileSync(certFile, 'utf8'), key: readFileSync(keyFile, 'utf8'), certFile };
}

function isGood(pem, addresses) {
  const certificate = new X509Certificate(pem);
  return Date.parse(certificate.validTo) > Date.now() + 30 * DAY && addresses.every((address) => certificate.checkIP(address) !== undefined);
}
