import { asc, eq, sql } from 'drizzle-orm';
import type { MadeProgram } from '#shared/makeProgram';
import type { ShopDatabase } from '../db/client';
import { programs } from '../db/schema';
import { useDatabase } from '../db/shop';

type GoodProgram = Extract<MadeProgram, { readonly ok: true }>;
export type KeptProgram = Awaited<ReturnType<ReturnType<typeof programsIn>['findByMark']>>[number];

/** The programs of one database, with its statements prepared once. */
export function programsIn(database: ShopDatabase) {
  const insert = database.insert(programs).values({
    sha256: sql.placeholder('sha256'),
    mark: sql.placeholder('mark'),
    fileName: sql.placeholder('fileName'),
    text: sql.placeholder('text'),
    spec: sql.placeholder('spec'),
    createdAt: sql.placeholder('createdAt'),
  }).onConflictDoNothing({ target: programs.sha256 }).prepare();

  const byMark = database
    .select({ sha256: programs.sha256, fileName: programs.fileName, program: programs.text, spec: programs.spec, createdAt: programs.createdAt })
    .from(programs).where(eq(programs.mark, sql.placeholder('mark'))).orderBy(asc(programs.id)).prepare();

  return {
    /** Keeps a program that passed its readback; one whose text is already kept stays as it is. */
    async keep({ sha256, mark, fileName, program, spec }: GoodProgram): Promise<void> {
      await insert.execute({ sha256, mark, fileName, text: program, spec, createdAt: new Date() });
    },
    /** Every program that bears the mark, the oldest first. */
    async findByMark(mark: string) {
      return await byMark.execute({ mark });
    },
  };
}

let prepared: { readonly database: ShopDatabase; readonly programs: ReturnType<typeof programsIn> } | undefined;

/** The statements of the database that stands: a restored one is another, and has its own. */
function ours() {
  const database = useDatabase();
  if (prepared?.database !== database) prepared = { database, programs: programsIn(database) };
  return prepared.programs;
}

export const keepProgram = (made: GoodProgram) => ours().keep(made);
export const findByMark = (mark: string) => ours().findByMark(mark);
