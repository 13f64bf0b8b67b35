import { foundIn } from '#server/access/found';
import { correctionOf } from '#server/services/bitCorrections';

/** Every width measured with a bit since it was put in, and the corrections accepted so far. */
export default defineEventHandler((event) => foundIn(event, correctionOf));
