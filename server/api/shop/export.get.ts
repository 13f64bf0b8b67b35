import { Readable } from 'node:stream';
import { callerOf } from '#server/access/person';
import { shopZip } from '#server/services/shopExport';

/** The whole shop as a zip of CSV lists and program files. */
export default defineEventHandler((event) => {
  setResponseHeaders(event, { 'content-type': 'application/zip', 'content-disposition': 'attachment; filename="tallyrail-shop.zip"' });
  const zip = Readable.from(shopZip(callerOf(event).shopId));
  zip.once('error', (error) => event.node.res.destroy(error)); // half a zip must not look like a whole one
  return sendStream(event, zip);
});
