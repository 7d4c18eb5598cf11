import { KIND_WORD, LOAD_KINDS } from '../loads/kinds.ts';
import { showQuantity } from '../quantity/index.ts';
import { startingLoads } from '../session/index.ts';
import type { Use } from '../timber/member.ts';

/** What an empty start offers. */
export const STARTS: readonly { readonly use: Use; readonly label: string }[] = [
  { use: 'floor', label: 'floor' },
  { use: 'roof', label: 'roof without ceiling' },
  { use: 'roof-ceiling', label: 'roof with a ceiling' },
  { use: 'roof-plaster', label: 'roof with a plaster ceiling' },
];

/** The usual loads of a use in a line: "dead 12 psf, live 40 psf". */
export function loadsText(use: Use): string {
  const area = startingLoads(use);
  return LOAD_KINDS.filter((kind) => area[kind] > 0)
    .map((kind) => `${KIND_WORD[kind]} ${showQuantity('areaLoad', area[kind], 'us')}`)
    .join(', ');
}
