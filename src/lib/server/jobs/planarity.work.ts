import type { BorderList } from '../../engines/borders/index.ts';
export interface PlanarityNote { planar: boolean; witness: { regions: number[]; sentence: string } | null }
export const planarityOf = (_regions: number, _borders: BorderList): PlanarityNote => ({ planar: true, witness: null });
