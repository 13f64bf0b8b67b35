import { z } from 'zod';
import { foundIn } from '#server/access/found';
import { callerOf } from '#server/access/person';
import { PAPERS } from '#server/papers/paper';
import { sheetPdf } from '#server/papers/sheet';
import { newestProgram } from '#server/services/bench';
import { shopOf } from '#server/services/people';
import { findRail } from '#server/services/rails';
import { problem } from '#server/utils/problem';
import { answerPdf, benchLink } from '#server/utils/answerPdf';
import { readQueryAs } from '#server/utils/readQueryAs';

/** The setup sheet of a rail's newest program, on Letter or with `?paper=a4`. */
export default defineEventHandler(async (event) => {
  const { paper } = readQueryAs(event, z.strictObject({ paper: z.enum(PAPERS, { error: 'Use letter or a4.' }).default('letter') }));
  const [rail, { shopId }] = [await foundIn(event, findRail), callerOf(event)];
  const program = await newestProgram(shopId, rail.id);
  if (!program) throw problem(404, 'This rail has no program yet, and so no setup sheet. Make its program first.');
  return answerPdf(event, program.fileName, await sheetPdf({ rail, program, shop: (await shopOf(shopId))?.name ?? '', link: benchLink(event, rail.id, program.mark) }, paper));
});
