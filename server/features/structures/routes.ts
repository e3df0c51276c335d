import { Problem } from '@/server/http/problems';
import { route, type Route } from '@/server/http/route';
import { findDoubleBonds } from '@/server/structures/doubleBonds';
import { doubleBondsRequest, doubleBondsResponse } from '@/shared/contracts/quickLook';

export const structureRoutes = (): Route[] => [
  route({ method: 'post', path: '/api/structures/double-bonds', access: 'none', summary: 'Which C=C a SMILES holds, with the groups on each end', body: doubleBondsRequest, response: doubleBondsResponse },
    async ({ body }) => {
      const found = await findDoubleBonds(body.smiles);
      if ('sentence' in found) throw new Problem('invalid-input', found.sentence, { errors: [{ pointer: '#/smiles', detail: found.sentence, code: 'smiles' }] });
      return found;
    }),
];
