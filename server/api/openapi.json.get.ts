import { openApiDocument } from '#server/openapi/document';

/** What this API takes and answers, as OpenAPI 3.1. */
export default defineEventHandler(() => openApiDocument);
