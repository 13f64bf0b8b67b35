import { foundIn } from '#server/access/found';
import { findRailProgram } from '#server/services/railPrograms';

/** One program of the shop, with its text and all it was made from. */
export default defineEventHandler((event) => foundIn(event, findRailProgram));
