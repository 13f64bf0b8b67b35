import { type PieceInput, type PieceSpec, pieceSchema } from '#shared/piece/spec';

/** A small thirteen-stripe board with rails on stripes 4, 8 and 12, the first beside the union: common practice, no source. */
export const THIRTEEN: PieceInput = {
  units: 'in', kind: 'striped-flag', style: 'leaning', width: 37, height: '19 1/2', railLanes: [4, 8, 12], gap: '1/4',
  railWidth: '1 1/4', railThickness: '3/4', grooveWidth: '3/8', grooveDepth: '3/16', stopMargin: '7/8', laneMargin: '7/8',
};

/** The piece that a raw one becomes; one that is refused is a mistake of the test's. */
export function pieceOf(raw: PieceInput): PieceSpec {
  const parsed = pieceSchema.safeParse(raw);
  if (!parsed.success) throw new Error(`refused: ${parsed.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`).join(' ')}`);
  return parsed.data;
}
